import {
  addElementSet,
  createClub,
  createClubDate,
  createInstrument,
  createProgramme,
  createSite,
  createTarget,
  type Database,
  makeEvent,
  publishEvent,
  rankEvenings,
} from '#club';
import { COMET_NAME, cometElementSets } from './orbits';
import { DEMO_INSTRUMENTS, DEMO_PROGRAMMES, demoTargets } from './programmes';
import { demoSites } from './sites';

/** What was loaded, for a person. */
export interface LoadedDemo {
  readonly club: string;
  readonly asOf: string;
  readonly sites: number;
  readonly targets: number;
  readonly programmes: number;
  readonly event: string;
}

const DAY_MS = 86_400_000;

/**
 * Loads the invented demo club into a database that holds none. All is built around a day, so that its comet
 * is in the coming season's evenings; one event, the best of the next weeks, is published.
 */
export async function loadDemo(database: Database, { asOf }: { readonly asOf: string }): Promise<LoadedDemo> {
  const club = await createClub(database, {
    name: 'Arvenn Marches Stargazers',
    bringWords:
      'Warm clothes for two hours of standing still, sturdy shoes, a red torch. Children come with an adult. Dogs and white lights stay at home.',
    callOffWords:
      'By 16:00 on the day this page says whether we meet. Cloud over more than half the sky calls it off.',
  });
  const sites = demoSites(asOf);
  for (const site of sites) await createSite(database, site);
  for (const instrument of DEMO_INSTRUMENTS) await createInstrument(database, instrument);
  const targets = demoTargets(asOf);
  for (const target of targets) await createTarget(database, target);
  for (const programme of DEMO_PROGRAMMES) await createProgramme(database, programme);
  await createClubDate(database, { date: fridayAfter(asOf, 40), name: 'annual meeting' });
  await createClubDate(database, { date: fridayAfter(asOf, 75), name: 'telescope-making course' });
  const event = await publishBest(database, asOf);
  // After the event was judged, so that the program has something to say of what new elements change.
  await addElementSet(database, `Comet ${COMET_NAME}`, cometElementSets(asOf)[1]);
  return {
    club: club.name,
    asOf,
    sites: sites.length,
    targets: targets.length,
    programmes: DEMO_PROGRAMMES.length,
    event,
  };
}

async function publishBest(database: Database, asOf: string): Promise<string> {
  const programmeName = DEMO_PROGRAMMES[0]!.name;
  const { evenings } = await rankEvenings(database, {
    from: daysAfter(asOf, 10),
    to: daysAfter(asOf, 45),
    programmeName,
    limit: 1,
  });
  const { site, date } = evenings[0]!;
  const event = await makeEvent(database, { siteName: site, programmeName, date });
  await publishEvent(database, event.id);
  return `${date} at ${site}`;
}

function daysAfter(date: string, days: number): string {
  return new Date(Date.parse(date) + days * DAY_MS).toISOString().slice(0, 10);
}

/** The first Friday at least some days after a date. */
function fridayAfter(date: string, days: number): string {
  const start = new Date(Date.parse(date) + days * DAY_MS);
  return daysAfter(start.toISOString().slice(0, 10), (5 - start.getUTCDay() + 7) % 7);
}
