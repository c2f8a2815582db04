import { clockWords, listWords } from '#nights';
import { BODY, BOLD, Composer, SMALL } from './composer';
import { type PacketContent } from './content';
import { type TextSheet } from './sheet';
import { coordinateWords, dateWords, elementWords, hoursWords, plural } from './words';

/** A line of the cover's table of contents. */
export interface ContentsLine {
  readonly title: string;
  /** Number of its first sheet. */
  readonly number: number;
}

const HOUR_MS = 3_600_000;

const STATUS_WORDS = {
  draft: 'Draft, not yet shown to the public',
  published: 'Published',
  calledOff: 'CALLED OFF',
} as const;

/** What, where, when, who, the weather rule, the cautions and what the packet holds. */
export function coverSheet(
  content: PacketContent,
  contents: readonly ContentsLine[],
  footLines: number,
): TextSheet[] {
  const { event, club, site, stations } = content;
  const page = new Composer({
    name: 'cover',
    paper: content.paper,
    title: event.title,
    subtitle: `${club.name} · ${dateWords(event.date, club.locale)} · ${site.name}`,
    corner: ['Evening packet', 'for the coordinator', STATUS_WORDS[event.status]],
    footLines,
  });
  const facts: [string, string][] = [
    [
      'When',
      `${dateWords(event.date, club.locale)}, visitors from ${hoursWords(event, event.zone)} (clock times of ${event.zone})`,
    ],
    ['Light', lightWords(content)],
    [
      'Where',
      `${site.name}, ${coordinateWords(site.latitudeDeg, site.longitudeDeg)}, ${String(Math.round(site.elevationM))} m above the sea. ${gateWords(content)}`,
    ],
    ['What', whatWords(content)],
    [
      'Weather',
      club.callOffWords === ''
        ? 'The club has entered no rule for calling an evening off.'
        : club.callOffWords,
    ],
    ['Bring', club.bringWords === '' ? 'Nothing entered.' : club.bringWords],
    ...(event.words === '' ? [] : ([['Told to the public', event.words]] as [string, string][])),
  ];
  page.table(
    [
      { head: '', share: 0.16, style: BOLD },
      { head: '', share: 0.84, style: BODY },
    ],
    facts,
  );
  page.gap(4);
  page.heading('Who');
  for (const { name } of stations) page.blank(name);
  page.blank('Welcome and car park');
  page.blank('Coordinator, and how to reach');
  page.gap(4);
  page.heading('Cautions');
  page.list(content.cautions, { ...BODY, sizePt: 9 });
  page.gap(3);
  page.heading('In this packet');
  page.paragraph(contents.map(({ title, number }) => `${title} ${String(number)}`).join(' · '), SMALL);
  page.gap(3);
  page.heading('Computed from');
  page.paragraph(computedFrom(content), SMALL);
  return page.sheets();
}

function lightWords(content: PacketContent): string {
  const { light, event } = content;
  const at = (words: string, ms: number | null): string[] =>
    ms === null ? [] : [`${words} ${clockWords(ms, event.zone)}`];
  const sun = [
    ...at('Sunset', light.sunsetMs),
    ...at('civil dusk', light.civilDuskMs),
    ...at('fully dark from', light.astronomicalDuskMs),
  ];
  return [
    sun.length === 0
      ? 'The Sun does not set.'
      : `${listWords(sun)}${light.astronomicalDuskMs === null ? '; it does not get fully dark' : ''}.`,
    moonWords(content),
  ].join(' ');
}

/** Whether the Moon is up in the public hours, and its rising and setting from sunset to some hours after them. */
function moonWords({ light, event }: PacketContent): string {
  const hours = (event.endMs - event.startMs) / 60_000;
  const up =
    light.moonUpMinutes < 1
      ? 'is down'
      : light.moonUpMinutes > hours - 1
        ? 'is up'
        : `is up for ${String(Math.round(light.moonUpMinutes))} of the ${String(Math.round(hours))} minutes`;
  const turns = (
    [
      ['rises', light.moonriseMs],
      ['sets', light.moonsetMs],
    ] as const
  )
    .flatMap(([verb, ms]) => (ms === null ? [] : [{ verb, ms }]))
    .filter(({ ms }) => ms > event.startMs - 3 * HOUR_MS && ms < event.endMs + 8 * HOUR_MS)
    .sort((a, b) => a.ms - b.ms)
    .map(({ verb, ms }) => `${verb} at ${clockWords(ms, event.zone)}`);
  const lit = `${String(Math.round(light.moonLitShare * 100))}% lit`;
  return `The Moon, ${lit}, ${up} in the public hours${turns.length === 0 ? '' : `; it ${listWords(turns)}`}.`;
}

function gateWords({ site: { gate } }: PacketContent): string {
  const parts = [
    ...(gate.opens === null ? [] : [`opens ${gate.opens}`]),
    ...(gate.closes === null ? [] : [`shuts ${gate.closes}`]),
  ];
  return parts.length === 0 ? 'No gate hours.' : `The gate ${listWords(parts)}.`;
}

function whatWords({ targets, runSheet, stations }: PacketContent): string {
  const planned = runSheet.slots.length;
  if (planned === 0) return 'Nothing can be shown in these hours.';
  const inOrder = targets.filter(({ name }) => runSheet.slots.some(({ target }) => target === name));
  return `${plural(planned, 'target')} at ${plural(stations.length, 'station')}: ${listWords(inOrder.map(({ name }) => name))}.`;
}

function computedFrom({ imprint, event, revision }: PacketContent): string {
  const sets = imprint.elementSets.map(
    (set) =>
      `${set.target}: ${elementWords(set, event.startMs)}${set.source === '' ? '' : ` (${set.source})`}`,
  );
  return [
    `Revision ${revision} stands for these inputs: public hours ${imprint.hours.startsAt} to ${imprint.hours.endsAt}`,
    `site ${imprint.site}`,
    `programme ${imprint.programme}`,
    `words ${imprint.words}`,
    `star catalogue ${imprint.catalogueVersion}`,
    `Duskwright ${imprint.programVersion}`,
    sets.length === 0 ? 'no orbital elements' : `orbital elements of ${sets.join('; ')}`,
  ]
    .join('; ')
    .concat('. Sheets of the same revision belong together; when an input changes, the revision does.');
}
