import { BODY, BOLD, Composer, SMALL } from './composer';
import { type PacketContent } from './content';
import { type TextSheet } from './sheet';
import { skylineFigure, skylineWords } from './skyline';
import { coordinateWords, occasionWords } from './words';

const SKYLINE_MM = 62;

/** The way there, the gate, what is dangerous, whom to call, and the skyline around the compass. */
export function siteSheet(content: PacketContent, footLines: number): TextSheet[] {
  const { site, club } = content;
  const page = new Composer({
    name: 'site',
    paper: content.paper,
    title: site.name,
    subtitle: occasionWords(content),
    corner: ['Site sheet', 'for everyone who helps'],
    footLines,
  });
  const { opens, closes } = site.gate;
  page.table(
    [
      { head: '', share: 0.2, style: BOLD },
      { head: '', share: 0.8, style: BODY },
    ],
    [
      [
        'Place',
        `${coordinateWords(site.latitudeDeg, site.longitudeDeg)}, ${String(Math.round(site.elevationM))} m above the sea`,
      ],
      [
        'The way there, and parking',
        site.directions === '' ? 'The club has entered no directions.' : site.directions,
      ],
      [
        'Gate',
        opens === null && closes === null
          ? 'No hours entered.'
          : [
              ...(opens === null ? [] : [`Opens ${opens}.`]),
              ...(closes === null ? [] : [`Shuts ${closes}: be out by then.`]),
            ].join(' '),
      ],
      [
        'Hazards',
        site.hazards === ''
          ? 'The club has entered none. Walk the ground by daylight before visitors come, and mark what you find.'
          : site.hazards,
      ],
      [
        'In an emergency',
        site.emergencyWords === ''
          ? 'The club has entered nothing. Before the evening, write down here the emergency number that holds at this place, where a phone has signal, and the nearest road an ambulance can reach:'
          : site.emergencyWords,
      ],
    ],
  );
  if (site.emergencyWords === '') {
    page.blank('Number');
    page.blank('Signal at');
    page.blank('Ambulance to');
  }
  page.gap(4);
  page.heading('The skyline, once around the compass', 12, SKYLINE_MM);
  page.figure(
    `${skylineWords(site.horizon)} Numbers mark where targets of the run sheet stand in their looks.`,
    SKYLINE_MM,
    (box) => skylineFigure(content, box),
  );
  page.paragraph(
    `Heights in degrees above the level; a fist at arm's length covers about 10°. Rings carry the numbers of the run sheet, where each target stands in the middle of its look. Sky overhead on a clear night without Moon: ${site.skyMagPerArcsec2.toFixed(1)} magnitudes a square arcsecond.`,
    SMALL,
  );
  page.gap(4);
  page.heading('Looking after people');
  page.list(
    [
      'White light only until visitors have parked, and in an emergency.',
      'Count helpers in and out; nobody walks to the cars alone.',
      'Cold comes first to those who stand still: watch children and older visitors, and let them warm up in between.',
      'Keep cables, tripods and edges marked with dim red light.',
      'Leave animals and plants alone, and take home what you brought.',
      ...(club.callOffWords === '' ? [] : [`Calling off: ${club.callOffWords}`]),
      'These are general cautions: local codes, the owner of the site and licensed practice come first.',
    ],
    { ...BODY, sizePt: 9 },
  );
  return page.sheets();
}
