import { clockWords } from '#nights';
import { type Box, Composer, lineAt, rule, SMALL, type TextStyle } from './composer';
import { type PacketContent, type PacketTarget } from './content';
import { spokenFacts } from './facts';
import { lineWidthMm } from './lettering';
import { type RunSheet } from './runSheet';
import { type Ink, type TextSheet } from './sheet';
import { hoursWords, occasionWords, slotWords, standingWords } from './words';

const LANE_MM = 8;
const LANES_TOP_MM = 6;

/** Text sizes of the table, tried from the largest: a run sheet on one page is not mixed up in the dark. */
const SIZES_PT = [9.5, 9, 8.5, 8] as const;

/** The programme as a timetable: time, target, station, what to say; above it the stations side by side. */
export function runSheetSheet(content: PacketContent, footLines: number): TextSheet[] {
  let sheets: TextSheet[] = [];
  for (const sizePt of SIZES_PT) {
    sheets = runSheetAt(content, footLines, sizePt);
    if (sheets.length === 1) return sheets;
  }
  return runSheetAt(content, footLines, SIZES_PT[1]);
}

function runSheetAt(content: PacketContent, footLines: number, sizePt: number): TextSheet[] {
  const { event, runSheet, targets, stations, notShown } = content;
  const page = new Composer({
    name: 'runSheet',
    paper: content.paper,
    title: 'Run sheet',
    subtitle: occasionWords(content),
    corner: ['Run sheet', 'for everyone who helps'],
    footLines,
  });
  const cell: TextStyle = { face: 'sans', sizePt };
  const strong: TextStyle = { face: 'bold', sizePt: Math.min(10, sizePt + 0.5) };
  if (runSheet.slots.length === 0) {
    page.paragraph('Nothing on the programme can be shown in these hours. The end of this sheet says why.');
  } else {
    page.figure(lanesInWords(content), LANES_TOP_MM + stations.length * LANE_MM + 3, (box) =>
      lanes(content, box),
    );
    page.gap(2);
    const rows = runSheet.slots.map((slot) => {
      const number = targets.findIndex(({ name }) => name === slot.target);
      const target = targets[number]!;
      return [
        slotWords(slot, event.zone),
        String(number + 1),
        target.name,
        slot.station,
        standingWords(target.standing),
        [target.gloss, spokenFacts(target), caveat(target)].filter((part) => part !== '').join(' '),
      ];
    });
    page.table(
      [
        { head: 'Time', share: 0.125, style: strong },
        { head: '', share: 0.045, style: cell },
        { head: 'Target', share: 0.145, style: strong },
        { head: 'Station', share: 0.135, style: cell },
        { head: 'Where it stands', share: 0.15, style: cell },
        { head: 'What to say', share: 0.4, style: cell },
      ],
      rows,
      0.9,
    );
    page.gap(1);
    page.paragraph(
      'The number is the one on the map of the sky and on the skyline of the site sheet.',
      SMALL,
    );
  }
  for (const rest of runSheet.breaks) page.paragraph(`Break: ${hoursWords(rest, event.zone)}.`);
  if (runSheet.leftOut.length > 0) {
    page.gap(3);
    page.heading('If there is time');
    page.list(
      runSheet.leftOut.map(({ target, station, why }) => {
        const when = targets
          .find(({ name }) => name === target)!
          .intervals.map((part) => hoursWords(part, event.zone))
          .join(' and ');
        const reason =
          why === 'noRoom' ? `the ${station} is taken by heavier targets` : 'too short for a whole look';
        return `${target}, from ${when}, at the ${station}: ${reason}.`;
      }),
      cell,
    );
  }
  if (notShown.length > 0) {
    page.gap(3);
    page.heading('Not this evening');
    page.list(
      notShown.map(({ target, why }) => `${target}: ${why}`),
      cell,
    );
  }
  return page.sheets();
}

/** What may turn out otherwise because nobody knows a small body's brightness well. */
function caveat({ uncertain }: PacketTarget): string {
  return uncertain === null || uncertain.startsWith('the same') ? '' : `Brightness uncertain: ${uncertain}.`;
}

/** Time from left to right, one lane a station, a box a look. */
function lanes({ event, runSheet, stations, targets }: PacketContent, box: Box): Ink[] {
  const nameMm = Math.min(40, Math.max(...stations.map(({ name }) => lineWidthMm(name, 'bold', 8.5))) + 3);
  const left = box.leftMm + nameMm;
  const right = box.leftMm + box.widthMm;
  const { startMs, endMs } = runSheet.hours;
  const x = (ms: number): number => left + ((right - left) * (ms - startMs)) / (endMs - startMs);
  const top = box.topMm + LANES_TOP_MM;
  const bottom = top + stations.length * LANE_MM;
  const ink: Ink[] = [];
  const half = 30 * 60_000;
  for (let ms = Math.ceil(startMs / half) * half; ms <= endMs; ms += half) {
    ink.push({
      ...rule(0, 0, 0, 0.3, 0.55),
      points: [
        [x(ms), top - 1.2],
        [x(ms), bottom],
      ],
    } as Ink);
    const words = clockWords(ms, event.zone);
    const half_ = lineWidthMm(words, 'sans', 8) / 2;
    ink.push(
      lineAt(
        words,
        Math.min(Math.max(x(ms), left + half_), right - half_),
        top - 2,
        { face: 'sans', sizePt: 8 },
        0.5,
      ),
    );
  }
  for (const rest of runSheet.breaks) {
    ink.push({ shape: 'area', points: corners(x(rest.startMs), top, x(rest.endMs), bottom), gray: 0.85 });
    ink.push(
      lineAt('break', (x(rest.startMs) + x(rest.endMs)) / 2, bottom + 3, { face: 'sans', sizePt: 8 }, 0.5),
    );
  }
  stations.forEach(({ name }, lane) => {
    const y = top + lane * LANE_MM;
    ink.push(
      lineAt(shortened(name, nameMm - 2, 8.5), box.leftMm, y + LANE_MM / 2 + 1.1, {
        face: 'bold',
        sizePt: 8.5,
      }),
    );
    ink.push(rule(left, right, y + LANE_MM, 0.3, 0.55));
    for (const slot of runSheet.slots) {
      if (slot.station !== name) continue;
      const [from, to] = [x(slot.startMs) + 0.25, x(slot.endMs) - 0.25];
      const around = corners(from, y + 0.9, to, y + LANE_MM - 0.9);
      ink.push({ shape: 'area', points: around, gray: 1 });
      ink.push({ shape: 'line', points: [...around, around[0]!, around[1]!], widthPt: 0.7, gray: 0 });
      const number = targets.findIndex((target) => target.name === slot.target) + 1;
      ink.push(
        lineAt(
          fittingWords(
            [`${slot.target} (${String(number)})`, slot.target, `(${String(number)})`],
            to - from - 1.4,
            8.5,
          ),
          (from + to) / 2,
          y + LANE_MM / 2 + 1.1,
          { face: 'sans', sizePt: 8.5 },
          0.5,
        ),
      );
    }
  });
  return ink;
}

function lanesInWords({ event, runSheet, stations }: PacketContent): string {
  return `The stations side by side over the public hours. ${stations
    .map(({ name }) => {
      const own = runSheet.slots.filter(({ station }) => station === name);
      return `${name}: ${own.map((slot) => `${slotWords(slot, event.zone)} ${slot.target}`).join(', ') || 'nothing'}`;
    })
    .join('. ')}.`;
}

/** The first of some words that fits a width; the last where none does. */
export function fittingWords(words: readonly string[], widthMm: number, sizePt: number): string {
  return words.find((text) => lineWidthMm(text, 'sans', sizePt) <= widthMm) ?? words.at(-1)!;
}

/** A name cut to a width, with an ellipsis where it had to be. */
function shortened(name: string, widthMm: number, sizePt: number): string {
  if (lineWidthMm(name, 'bold', sizePt) <= widthMm) return name;
  let length = name.length - 1;
  while (length > 1 && lineWidthMm(`${name.slice(0, length)}…`, 'bold', sizePt) > widthMm) length -= 1;
  return `${name.slice(0, length)}…`;
}

function corners(left: number, top: number, right: number, bottom: number): [number, number][] {
  return [
    [left, top],
    [right, top],
    [right, bottom],
    [left, bottom],
  ];
}

/** The looks of one station. */
export function looksOf(runSheet: RunSheet, station: string): RunSheet['slots'] {
  return runSheet.slots.filter((slot) => slot.station === station);
}
