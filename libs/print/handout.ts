import { clockWords } from '#nights';
import { BODY, BOLD, Composer, SMALL, type TextStyle } from './composer';
import { type PacketContent, type PacketTarget } from './content';
import { factLine } from './facts';
import { scanCode } from './scanCode';
import { SIDE_MM, type TextSheet } from './sheet';
import { RIM_MM, skyMapFigure } from './skyMap';
import { dateWords, hoursWords, plural, seenWords } from './words';

/** Text sizes tried from the largest; the first with which the second side fits is taken. */
const SIZES_PT = [11, 10.5, 10, 9.5, 9, 8.5, 8] as const;
const MOST_NEXT = 4;
const CODE_MM = 32;
const GUTTER_MM = 8;

/** One sheet for visitors, two sides: the sky of that night, and what each target is. */
export function handout(content: PacketContent, footLines: number): TextSheet[] {
  const front = skySide(content, footLines);
  for (const sizePt of SIZES_PT) {
    const back = targetSide(content, content.targets, sizePt, footLines);
    if (back !== null) return [front, back];
  }
  // A programme too long for one side: as many as fit, in the order of the run sheet.
  for (let count = content.targets.length - 1; count > 0; count--) {
    const back = targetSide(content, content.targets.slice(0, count), SIZES_PT.at(-1)!, footLines);
    if (back !== null) return [front, back];
  }
  return [front];
}

function skySide(content: PacketContent, footLines: number): TextSheet {
  const { event, sky, site, targets, club } = content;
  const page = new Composer({
    name: 'handout',
    paper: content.paper,
    title: "Tonight's sky",
    subtitle: `${dateWords(event.date, club.locale)} at ${clockWords(sky.utcMs, event.zone)}, from ${site.name}`,
    corner: [club.name, 'for our visitors'],
    footLines,
  });
  page.paragraph(
    'Hold this side over your head and turn it until the letter of the direction you face is at the bottom: the stars above that edge are the ones before you. The middle of the map is straight overhead, the grey rim is the ground.',
    { ...BODY, sizePt: 11 },
  );
  page.gap(2);
  const under = 16;
  const radius = Math.min(page.widthMm / 2 - RIM_MM, (page.freeMm - under) / 2 - RIM_MM);
  page.figure(mapInWords(content), 2 * (radius + RIM_MM), (box) =>
    skyMapFigure(content, [box.leftMm + box.widthMm / 2, box.topMm + radius + RIM_MM], radius),
  );
  page.gap(1.5);
  page.paragraph(
    `Rings: what we show tonight, by the numbers overleaf (${targets.map(({ name }, index) => `${String(index + 1)} ${name}`).join(', ')}). The larger the dot, the brighter the star.`,
    { ...BODY, sizePt: 10.5 },
  );
  return page.sheets()[0]!;
}

function mapInWords({ sky, targets, event }: PacketContent): string {
  const up = targets.filter(({ atMiddle }) => atMiddle.altitudeDeg > 0);
  return `Map of the whole sky at ${clockWords(sky.utcMs, event.zone)}: ${up
    .map(({ name, atMiddle }) => `${name} ${seenWords({ ...atMiddle, utcMs: sky.utcMs }, event.zone)}`)
    .join('; ')}.`;
}

/** The second side at a text size; null where it does not fit. */
function targetSide(
  content: PacketContent,
  targets: readonly PacketTarget[],
  sizePt: number,
  footLines: number,
): TextSheet | null {
  const { club, event, site } = content;
  const page = new Composer({
    name: 'handout',
    paper: content.paper,
    title: 'What you can see tonight',
    subtitle: `${dateWords(event.date, club.locale)}, ${hoursWords(event, event.zone)}, ${site.name}`,
    corner: [club.name, 'for our visitors'],
    footLines,
  });
  const top = page.y;
  const bottom = page.bottomMm - nextMm(content, sizePt);
  const width = (page.widthMm - GUTTER_MM) / 2;
  const style: TextStyle = { face: 'sans', sizePt };
  let left = SIDE_MM;
  page.column(left, left + width, top);
  for (const target of targets) {
    const number = content.targets.indexOf(target) + 1;
    const height = measured(content, (draft) => entry(draft, content, target, number, style), width);
    if (page.y + height > bottom) {
      if (left > SIDE_MM) return null;
      left = SIDE_MM + width + GUTTER_MM;
      page.column(left, left + width, top);
      if (page.y + height > bottom) return null;
    }
    entry(page, content, target, number, style);
  }
  page.wholeWidth(bottom);
  if (targets.length < content.targets.length) {
    page.paragraph(
      `And ${plural(content.targets.length - targets.length, 'more target')}: ask at the telescopes.`,
      SMALL,
    );
  }
  nextEvenings(page, content, sizePt);
  return page.pageCount === 1 ? { ...page.sheets()[0]!, continued: true } : null;
}

function entry(
  page: Composer,
  { event }: PacketContent,
  target: PacketTarget,
  number: number,
  style: TextStyle,
): void {
  const name = target.otherName === null ? target.name : `${target.otherName} (${target.name})`;
  page.paragraph(`${String(number)}  ${name}`, { face: 'bold', sizePt: style.sizePt + 1 });
  const where = target.facts.constellation === null ? '' : ` in ${target.facts.constellation}`;
  page.paragraph(
    `${capital(target.kind)}${where}; ${seenWords(target.standing, event.zone)}; ${target.station}.`,
    style,
  );
  const words = [target.gloss, factLine(target)].filter((part) => part !== '').join(' ');
  if (words !== '') page.paragraph(words, style);
  page.gap(style.sizePt * 0.28);
}

/** The height that some paragraphs take in a column, from a page of their own. */
function measured(content: PacketContent, write: (page: Composer) => void, widthMm: number): number {
  const page = new Composer({
    name: 'handout',
    paper: content.paper,
    title: '',
    subtitle: '',
    corner: [''],
    footLines: 1,
  });
  const from = page.y;
  page.column(SIDE_MM, SIDE_MM + widthMm, from);
  write(page);
  return page.y - from;
}

function nextMm(content: PacketContent, sizePt: number): number {
  const page = new Composer({
    name: 'handout',
    paper: content.paper,
    title: '',
    subtitle: '',
    corner: [''],
    footLines: 1,
  });
  const from = page.y;
  nextEvenings(page, content, sizePt);
  return page.y - from + 5;
}

/** Evenings to come, with the schedule's address as words and as a code to scan. */
function nextEvenings(page: Composer, content: PacketContent, sizePt: number): void {
  const { club, event, schedule } = content;
  const style: TextStyle = { face: 'sans', sizePt: Math.min(10, sizePt) };
  page.rule(0.8);
  page.gap(1.5);
  const top = page.y;
  const right = page.size.widthMm - SIDE_MM;
  const address = club.scheduleAddress;
  page.column(SIDE_MM, address === null ? right : right - CODE_MM - 4, top);
  page.heading('Come again');
  const next = schedule.filter(({ startMs }) => startMs > event.startMs).slice(0, MOST_NEXT);
  if (next.length === 0) page.paragraph('The next evenings are not yet fixed; ask us tonight.', style);
  for (const one of next) {
    page.paragraph(
      `${dateWords(one.date, club.locale)}, ${hoursWords(one, one.zone)}: ${one.title}${one.title.includes(one.siteName) ? '' : `, ${one.siteName}`}`,
      style,
    );
  }
  if (address !== null) {
    page.paragraph(`All dates, and whether we meet in bad weather: ${address}`, {
      ...BOLD,
      sizePt: style.sizePt,
    });
  }
  page.paragraph('Never look near the Sun through a telescope or binoculars. Drive home rested.', {
    ...SMALL,
    sizePt: Math.max(8, style.sizePt - 1),
  });
  const height = page.y;
  if (address !== null) {
    page.column(right - CODE_MM, right, top);
    page.figure(`QR code of ${address}`, CODE_MM, (box) => scanCode(address, box.leftMm, box.topMm, CODE_MM));
  }
  page.wholeWidth(Math.max(height, page.y));
}

function capital(words: string): string {
  return `${words[0]?.toUpperCase() ?? ''}${words.slice(1)}`;
}
