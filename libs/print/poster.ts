import { listWords } from '#nights';
import { Composer, type TextStyle } from './composer';
import { type PacketContent, type ScheduledEvent } from './content';
import { scanCode } from './scanCode';
import { SIDE_MM, type TextSheet } from './sheet';
import { dateWords, hoursWords } from './words';

const CODE_MM = 42;
/** Sizes of a line of the list tried from the largest. */
const SIZES_PT = [34, 30, 26, 23, 20, 18, 16, 14, 12, 11, 10] as const;
const MOST_NAMED = 5;

/** The season's public evenings on one sheet to pin up. */
export function poster(content: PacketContent, footLines: number): TextSheet[] {
  for (const sizePt of SIZES_PT) {
    const sheets = posterAt(content, content.schedule, sizePt, footLines);
    if (sheets.length === 1) return sheets;
  }
  for (let count = content.schedule.length - 1; count > 0; count--) {
    const sheets = posterAt(content, content.schedule.slice(0, count), SIZES_PT.at(-1)!, footLines);
    if (sheets.length === 1) return sheets;
  }
  return posterAt(content, [], SIZES_PT.at(-1)!, footLines);
}

function posterAt(
  content: PacketContent,
  events: readonly ScheduledEvent[],
  sizePt: number,
  footLines: number,
): TextSheet[] {
  const { club } = content;
  const page = new Composer({
    name: 'poster',
    paper: content.paper,
    title: 'Evenings under the stars',
    subtitle: `Public viewing with ${club.name}. Come and look; no ticket, no telescope needed.`,
    corner: [],
    titlePt: 38,
    footLines,
  });
  const bottom = page.bottomMm - CODE_MM - 6;
  page.gap(4);
  if (events.length === 0) {
    page.paragraph('The next evenings are not yet fixed.', { face: 'sans', sizePt: 14 });
  }
  const small: TextStyle = { face: 'sans', sizePt: Math.max(10, sizePt * 0.62) };
  for (const event of events) {
    page.rule(0.8);
    page.gap(sizePt * 0.12);
    page.paragraph(dateWords(event.date, club.locale), { face: 'serif', sizePt });
    page.paragraph(`${hoursWords(event, event.zone)} · ${event.siteName}`, {
      face: 'bold',
      sizePt: small.sizePt,
    });
    page.paragraph(showWords(event), small);
    page.gap(sizePt * 0.25);
  }
  const fits = page.pageCount === 1 && page.y <= bottom;
  page.wholeWidth(bottom);
  page.rule(0.8);
  page.gap(3);
  const top = page.y;
  const right = page.size.widthMm - SIDE_MM;
  const address = club.scheduleAddress;
  page.column(SIDE_MM, address === null ? right : right - CODE_MM - 6, top);
  if (address !== null) page.paragraph(address, { face: 'bold', sizePt: 13 });
  if (club.callOffWords !== '') page.paragraph(club.callOffWords, { face: 'sans', sizePt: 11 });
  if (club.bringWords !== '') page.paragraph(`Bring: ${club.bringWords}`, { face: 'sans', sizePt: 10 });
  if (address !== null) {
    page.column(right - CODE_MM, right, top - 2);
    page.figure(`QR code of ${address}`, CODE_MM, (box) => scanCode(address, box.leftMm, box.topMm, CODE_MM));
  }
  return fits ? page.sheets() : [...page.sheets(), ...page.sheets()];
}

function showWords({ targets, title, siteName }: ScheduledEvent): string {
  const named = targets.slice(0, MOST_NAMED);
  const more = targets.length - named.length;
  const own = title.includes(siteName) ? '' : `${title}. `;
  if (named.length === 0) return own.trim();
  return `${own}${listWords([...named, ...(more > 0 ? ['more'] : [])])}, if the sky is clear.`;
}
