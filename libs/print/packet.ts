import { type Paper, type Scene } from '#charts';
import { BODY, Composer, lineAt, rule } from './composer';
import { type PacketContent } from './content';
import { type ContentsLine, coverSheet } from './coverSheet';
import { handout } from './handout';
import { wrapped } from './lettering';
import { poster } from './poster';
import { runSheetSheet } from './runSheetSheet';
import {
  FOOT_BASELINE_MM,
  FOOT_LINE_MM,
  FOOT_PT,
  type PacketSheet,
  PAPER_SIZES,
  type SheetName,
  SIDE_MM,
  type TextSheet,
} from './sheet';
import { siteSheet } from './siteSheet';
import { stationSheet } from './stationSheet';
import { imprintWords, occasionWords } from './words';

/** A finder chart to be drawn: its scene is asked for when its turn comes, with the foot line it must carry. */
export interface FinderOrder {
  /** "M 31, binoculars". */
  readonly title: string;
  readonly target: string;
  /** Gives the scene, or a sheet that says why there is none. */
  readonly scene: (foot: string) => Scene | { readonly refused: string };
}

/** Room kept for "Sheet 00 of 00" at the right of the foot. */
const NUMBER_MM = 26;

interface Chapter {
  readonly title: string;
  readonly name: SheetName;
  readonly sheets: readonly (TextSheet | FinderOrder)[];
}

/**
 * The sheets of a packet in the order asked for, numbered, each with the packet's revision and imprint at its
 * foot. They come one by one, charts drawn up as they are asked for, so that progress can be shown.
 */
export function packetSheets(
  content: PacketContent,
  names: readonly SheetName[],
  finders: readonly FinderOrder[],
): { readonly count: number; readonly sheets: Generator<PacketSheet, void> } {
  const foot = imprintWords(content);
  const lines = footLines(content.paper, foot).length;
  const withoutCover = names.map((name) => chapters(content, name, finders, lines));
  const coverLength = names.includes('cover') ? coverSheetCount(content, names, withoutCover, lines) : 0;
  const lengths = withoutCover.map((own, index) =>
    names[index] === 'cover' ? coverLength : own.reduce((sum, { sheets }) => sum + sheets.length, 0),
  );
  const count = lengths.reduce((sum, length) => sum + length, 0);
  return { count, sheets: numbered(content, names, withoutCover, lengths, count, foot, lines) };
}

function* numbered(
  content: PacketContent,
  names: readonly SheetName[],
  all: readonly (readonly Chapter[])[],
  lengths: readonly number[],
  count: number,
  foot: string,
  lines: number,
): Generator<PacketSheet, void> {
  let number = 0;
  for (let index = 0; index < names.length; index++) {
    const own: readonly (TextSheet | FinderOrder)[] =
      names[index] === 'cover'
        ? coverSheet(content, contentsOf(names, all, lengths), lines)
        : all[index]!.flatMap(({ sheets }) => sheets);
    for (const sheet of own) {
      number += 1;
      const place = `Sheet ${String(number)} of ${String(count)}`;
      yield 'kind' in sheet ? withFoot(sheet, foot, place) : finderSheet(content, sheet, place, lines);
    }
  }
}

/** The cover says where the others stand, and its own length moves them: laid out once to be counted. */
function coverSheetCount(
  content: PacketContent,
  names: readonly SheetName[],
  all: readonly (readonly Chapter[])[],
  lines: number,
): number {
  const contents = names.flatMap((_, index) =>
    all[index]!.slice(0, 1).map(({ title }) => ({ title, number: 88 })),
  );
  return coverSheet(content, contents, lines).length;
}

function contentsOf(
  names: readonly SheetName[],
  all: readonly (readonly Chapter[])[],
  lengths: readonly number[],
): ContentsLine[] {
  let number = 1;
  return names.flatMap((name, index) => {
    const first = number;
    number += lengths[index]!;
    return name === 'cover' || lengths[index] === 0 ? [] : [{ title: all[index]![0]!.title, number: first }];
  });
}

function chapters(
  content: PacketContent,
  name: SheetName,
  finders: readonly FinderOrder[],
  lines: number,
): Chapter[] {
  switch (name) {
    case 'cover':
      return [];
    case 'runSheet':
      return [{ name, title: 'Run sheet', sheets: runSheetSheet(content, lines) }];
    case 'finder':
      return finders.length === 0 ? [] : [{ name, title: 'Finder charts', sheets: finders }];
    case 'station':
      return content.stations.map((station) => ({
        name,
        title: 'Station sheets',
        sheets: stationSheet(content, station, lines),
      }));
    case 'site':
      return [{ name, title: 'Site sheet', sheets: siteSheet(content, lines) }];
    case 'handout':
      return [{ name, title: 'Handout for visitors', sheets: handout(content, lines) }];
    case 'poster':
      return [{ name, title: 'Poster', sheets: poster(content, lines) }];
  }
}

function finderSheet(content: PacketContent, order: FinderOrder, place: string, lines: number): PacketSheet {
  const foot = imprintWords(content, [order.target]);
  const scene = order.scene(`${place} · ${foot}`);
  if (!('refused' in scene)) {
    return { kind: 'chart', name: 'finder', title: order.title, continued: false, scene };
  }
  const [sheet] = refusedSheet(content, order.title, scene.refused, lines);
  return withFoot(sheet!, foot, place);
}

function refusedSheet(
  content: PacketContent,
  title: string,
  why: string,
  footLineCount: number,
): TextSheet[] {
  const page = new Composer({
    name: 'finder',
    paper: content.paper,
    title,
    subtitle: occasionWords(content),
    corner: ['Finder chart', 'not drawn'],
    footLines: footLineCount,
  });
  page.paragraph(`There is no chart: ${why}`, BODY);
  return page.sheets();
}

function footLines(paper: Paper, foot: string): string[] {
  return wrapped(foot, 'sans', FOOT_PT, PAPER_SIZES[paper].widthMm - 2 * SIDE_MM - NUMBER_MM);
}

function withFoot(sheet: TextSheet, foot: string, place: string): TextSheet {
  const lines = wrapped(foot, 'sans', FOOT_PT, sheet.widthMm - 2 * SIDE_MM - NUMBER_MM);
  const last = sheet.heightMm - FOOT_BASELINE_MM;
  const first = last - (lines.length - 1) * FOOT_LINE_MM;
  const style = { face: 'sans', sizePt: FOOT_PT } as const;
  const right = sheet.widthMm - SIDE_MM;
  return {
    ...sheet,
    parts: [
      ...sheet.parts,
      {
        tag: 'P',
        ink: lines.map((line, index) => lineAt(line, SIDE_MM, first + index * FOOT_LINE_MM, style)),
        parts: [],
      },
      { tag: 'P', ink: [lineAt(place, right, first, { face: 'bold', sizePt: FOOT_PT }, 1)], parts: [] },
    ],
    ornaments: [...sheet.ornaments, rule(SIDE_MM, right, first - 4.4)],
  };
}
