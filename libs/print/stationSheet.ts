import { BODY, BOLD, Composer } from './composer';
import { type PacketContent, type PacketStation } from './content';
import { factLine } from './facts';
import { looksOf } from './runSheetSheet';
import { type TextSheet } from './sheet';
import { elementWords, hoursWords, occasionWords, slotWords, standingWords } from './words';

/** One instrument's targets with their times, for the volunteer who runs it. */
export function stationSheet(content: PacketContent, station: PacketStation, footLines: number): TextSheet[] {
  const { event, runSheet, targets, imprint } = content;
  const page = new Composer({
    name: 'station',
    paper: content.paper,
    title: station.name,
    subtitle: occasionWords(content),
    corner: ['Station sheet', 'for the volunteer here'],
    footLines,
  });
  page.paragraph(station.words);
  page.blank('Volunteer');
  page.gap(3);
  const looks = looksOf(runSheet, station.name);
  if (looks.length === 0) page.paragraph('This station has no target in these hours.');
  for (const slot of looks) {
    const number = targets.findIndex(({ name }) => name === slot.target);
    const target = targets[number]!;
    page.need(30);
    page.rule(0.8);
    page.gap(1.5);
    page.heading(
      `${slotWords(slot, event.zone)}   ${target.name}${target.otherName === null ? '' : `, ${target.otherName}`}`,
      15,
      16,
    );
    const constellation = target.facts.constellation === null ? '' : `, in ${target.facts.constellation}`;
    const magnitude =
      target.facts.magnitude === null
        ? ''
        : `; magnitude ${target.facts.magnitude.toFixed(1).replace('-', '−')}`;
    page.paragraph(
      `Number ${String(number + 1)}: ${target.kind}${constellation}; in the middle of the look ${standingWords(target.standing)}${magnitude}.`,
      BOLD,
    );
    if (target.gloss !== '') page.paragraph(target.gloss);
    const facts = factLine(target);
    if (facts !== '') page.paragraph(facts);
    const shown = target.intervals.map((part) => hoursWords(part, event.zone)).join(' and ');
    page.paragraph(
      `It can be shown from ${shown}${target.uncertain === null ? '' : `; ${target.uncertain}`}.`,
      { ...BODY, sizePt: 9 },
    );
    const set = imprint.elementSets.find((one) => one.target === target.name);
    if (set !== undefined) {
      page.paragraph(`Its place is from ${elementWords(set, event.startMs)}.`, { ...BODY, sizePt: 9 });
    }
    for (const caution of target.cautions) page.paragraph(caution, BOLD);
    page.gap(3);
  }
  const spare = runSheet.leftOut.filter((left) => left.station === station.name);
  if (spare.length > 0) {
    page.heading('If the queue is short');
    page.list(
      spare.map(({ target }) => {
        const found = targets.find(({ name }) => name === target)!;
        const when = found.intervals.map((part) => hoursWords(part, event.zone)).join(' and ');
        return `${target}, from ${when}; best ${standingWords(found.standing)}. ${found.gloss}`;
      }),
      { ...BODY, sizePt: 9 },
    );
    page.gap(2);
  }
  page.heading('At the station');
  page.list(stationCautions(station), { ...BODY, sizePt: 9 });
  return page.sheets();
}

/** Common practice at public evenings. */
function stationCautions({ kind }: PacketStation): string[] {
  return [
    ...(kind === 'nakedEye'
      ? []
      : [
          'Never point it near the Sun; cap it while the Sun is up, and do not leave it alone with visitors.',
        ]),
    ...(kind === 'telescope'
      ? ['Keep the path to the eyepiece clear, mark the legs of the mount, and have a step for children.']
      : []),
    'Red light only. Point with words and hands; a laser only where local law allows it, never towards aircraft, vehicles or people.',
    'Local codes, the owner of the site and the club on the spot come first.',
  ];
}
