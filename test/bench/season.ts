import { type Body, Equator, Horizon, Observer as EngineObserver } from 'astronomy-engine';
import { BINOCULAR_10X50, TELESCOPE_200 } from '#darkness';
import { closeSearchPool, type Ranking, searchSeason, type SeasonSearch } from '#club';
import { DEFAULT_WEIGHTS, type ProgrammeItem } from '#nights';
import {
  ARCSEC,
  buildTrack,
  horizontalPlace,
  observerVector,
  place,
  seasonFrame,
  seasonSidereal,
  type SkyTarget,
  toDeg,
  toRad,
  trackPlace,
  utcMsToTtJd,
} from '#sky';
import {
  galaxy,
  inventedComet,
  inventedProgramme,
  inventedSite,
  planet,
  programmeItem,
} from '../../libs/nights/fixtures';
import { measurement, type Measurement, median, timed } from './measurement';

const SITES = 12;
const BODIES = ['Moon', 'Mercury', 'Venus', 'Mars', 'Jupiter', 'Saturn', 'Uranus', 'Neptune'] as const;

/** 12 sites, 365 evenings of 3 h in 5-minute steps, 40 targets: 8 planets and Moon, 12 small bodies, 20 fixed. */
function season(): SeasonSearch {
  const items: ProgrammeItem[] = [
    ...BODIES.map((body) => programmeItem(planet(body))),
    ...Array.from({ length: 12 }, (_, i) =>
      programmeItem(
        withEpoch(
          inventedComet(`2027-0${1 + (i % 9)}-12T00:00:00Z`, {
            q: 0.5 + 0.2 * i,
            e: i % 3 === 0 ? 1 : 0.2 + 0.05 * i,
            node: 30 * i,
          }),
        ),
        { instrument: BINOCULAR_10X50 },
      ),
    ),
    ...Array.from({ length: 20 }, (_, i) =>
      programmeItem(galaxy(18 * i, 5 * i - 30, 6 + 0.2 * i, 5 + i), { instrument: TELESCOPE_200 }),
    ),
  ];
  return {
    sites: Array.from({ length: SITES }, (_, i) =>
      inventedSite({ name: `Site ${i}`, latitudeDeg: 35 + 1.5 * i, longitudeDeg: i }),
    ),
    programme: inventedProgramme({ items }),
    clubDates: [],
    from: '2027-01-01',
    to: '2027-12-31',
    weights: DEFAULT_WEIGHTS,
    limit: 20,
  };
}

/** Elements with an epoch before the season, so that the planets move the body. */
function withEpoch(target: SkyTarget): SkyTarget {
  if (target.kind !== 'orbit') return target;
  const epochTtJd = utcMsToTtJd(Date.parse('2026-11-01T00:00:00Z'));
  return { ...target, elements: { ...target.elements, epochTtJd } };
}

/** The season search: time, rate beside one library call a place and instant, agreement, peak memory. */
export async function benchSeason(): Promise<Measurement[]> {
  const search = season();
  const runs: Ranking[] = [];
  for (let i = 0; i < 4; i++) runs.push(await searchSeason(search));
  await closeSearchPool();
  const [cold, ...warm] = runs.map(({ searched }) => searched.milliseconds);
  const { steps, evenings } = runs[0]!.searched;
  const milliseconds = median(warm);
  const perCall = libraryCallMs();
  return [
    measurement(
      'season-search',
      milliseconds,
      'ms',
      'one astronomy-engine call (Equator and Horizon of a planet) a place and instant, the same number of them, one core',
      perCall * steps,
      `${evenings} evenings, ${search.programme.items.length} targets, ${steps} places with sky brightness and visibility; the first run, workers starting, ${cold!} ms`,
    ),
    ...altitudeAgreement(),
    measurement('season-memory', process.resourceUsage().maxRSS / 1024, 'MB', 'bound', 500),
  ];
}

/** Mean cost of the library's own way, over the planets and the Moon. */
function libraryCallMs(): number {
  const calls = 4000;
  const observer = new EngineObserver(47.1, 8.2, 600);
  const bodies = BODIES.map((body) => body as Body);
  const run = (count: number) =>
    timed(() => {
      for (let i = 0; i < count; i++) {
        const date = new Date(Date.UTC(2027, 0, 1) + i * 300_000);
        const { ra, dec } = Equator(bodies[i % bodies.length]!, date, observer, true, true);
        Horizon(date, observer, ra, dec);
      }
    });
  run(calls);
  return run(calls) / calls;
}

/** Worst difference in altitude between the season's tracks and places worked out one by one. */
function altitudeAgreement(): Measurement[] {
  const from = Date.parse('2027-01-01T00:00:00Z');
  const frame = seasonFrame(from, from + 365 * 86_400_000);
  const site = inventedSite();
  const engineObserver = new EngineObserver(47.1, 8.2, 600);
  const targets: SkyTarget[] = [
    ...BODIES.map(planet),
    inventedComet('2027-04-12T00:00:00Z'),
    galaxy(202.5, 47.2),
  ];
  const out = new Float64Array(3);
  let worst = 0;
  const worstToLibrary: string[] = [];
  for (const target of targets) {
    const track = buildTrack(target, frame);
    let worstHere = 0;
    for (let i = 0; i < 400; i++) {
      const utcMs = from + i * 78_840_000;
      const sidereal = seasonSidereal(frame, utcMs) + site.observer.longitudeRad;
      trackPlace(track, utcMs, out);
      const stand = track.nearby ? observerVector(site.observer, sidereal) : [0, 0, 0];
      const { altitudeRad } = horizontalPlace(
        [out[0]! - stand[0]!, out[1]! - stand[1]!, out[2]! - stand[2]!],
        sidereal,
        site.observer.latitudeRad,
      );
      const single = place(target, utcMs, site.observer).horizontal!.altitudeRad;
      worst = Math.max(worst, Math.abs(altitudeRad - single) / ARCSEC);
      if (target.kind === 'solarSystem') {
        const date = new Date(utcMs);
        const { ra, dec } = Equator(target.body as Body, date, engineObserver, true, true);
        const library = toRad(Horizon(date, engineObserver, ra, dec).altitude);
        worstHere = Math.max(worstHere, Math.abs(altitudeRad - library) / ARCSEC);
      }
    }
    if (target.kind === 'solarSystem') worstToLibrary.push(`${target.name} ${worstHere.toFixed(1)}`);
  }
  return [
    measurement(
      'season-altitudes',
      worst,
      'arcsec',
      'bound, against places worked out one by one',
      5,
      `against the library without the correction to DE431: ${worstToLibrary.join(', ')} (${toDeg(site.observer.latitudeRad).toFixed(1)} degrees north)`,
    ),
  ];
}
