import { BINOCULAR_10X50, NAKED_EYE, TELESCOPE_200 } from '#darkness';
import { type SkyTarget, toRad, utcMsToTtJd } from '#sky';
import { type HorizonPoint } from './horizon';
import { type DuskHours } from './hours';
import { type Programme, type ProgrammeItem } from './programme';
import { type NightSite } from './site';

/** Invented sites, targets and programmes for tests and the benchmark. */

export function inventedSite(
  change: Partial<NightSite> & { latitudeDeg?: number; longitudeDeg?: number } = {},
): NightSite {
  const { latitudeDeg = 47.1, longitudeDeg = 8.2, ...rest } = change;
  return {
    name: 'Invented Heath',
    observer: { latitudeRad: toRad(latitudeDeg), longitudeRad: toRad(longitudeDeg), elevationM: 600 },
    zone: 'Europe/Zurich',
    sky: { zenithMagPerArcsec2: 21.3, extinctionMagPerAirmass: 0.2, domes: [] },
    horizon: inventedSkyline(8),
    gate: { opens: null, closes: null },
    closed: [],
    ...rest,
  };
}

/** A jagged skyline up to some degrees high: trees, a ridge and two gaps. */
export function inventedSkyline(highestDeg: number): HorizonPoint[] {
  return [
    [0, 0.3],
    [40, 0.6],
    [90, 0.2],
    [91, 1],
    [95, 1],
    [96, 0.2],
    [150, 0.5],
    [180, 0.4],
    [200, 0.8],
    [240, 0.9],
    [241, 0.1],
    [260, 0.1],
    [261, 0.7],
    [300, 0.6],
  ].map(([azimuthDeg, share]) => ({ azimuthDeg: azimuthDeg!, altitudeDeg: share! * highestDeg }));
}

export const DUSK_HOURS: DuskHours = {
  kind: 'dusk',
  from: 'civilDusk',
  offsetMinutes: 20,
  durationMinutes: 180,
  latest: null,
};

export function planet(
  body: 'Mercury' | 'Venus' | 'Mars' | 'Jupiter' | 'Saturn' | 'Uranus' | 'Neptune' | 'Moon',
): SkyTarget {
  return { kind: 'solarSystem', name: body, body };
}

/** An invented galaxy at a J2000 place in degrees. */
export function galaxy(raDeg: number, decDeg: number, magnitude = 8, sizeArcmin = 10): SkyTarget {
  return {
    kind: 'fixed',
    name: `Galaxy at ${raDeg} ${decDeg}`,
    raRad: toRad(raDeg),
    decRad: toRad(decDeg),
    magnitude,
    majorArcmin: sizeArcmin,
    minorArcmin: sizeArcmin / 2,
  };
}

/** An invented comet that passes perihelion on a date. */
export function inventedComet(
  perihelion: string,
  change: { q?: number; e?: number; node?: number } = {},
): SkyTarget {
  const { q = 0.9, e = 1, node = 70 } = change;
  return {
    kind: 'orbit',
    name: `Comet of ${perihelion} ${q} ${node}`,
    elements: {
      perihelionDistanceAu: q,
      eccentricity: e,
      inclinationRad: toRad(50),
      nodeRad: toRad(node),
      argumentOfPerihelionRad: toRad(120),
      perihelionTtJd: utcMsToTtJd(Date.parse(perihelion)),
      epochTtJd: null,
    },
    brightness: { kind: 'comet', absoluteMagnitude: 7, activity: 4 },
    comaArcmin: 6,
  };
}

export function programmeItem(target: SkyTarget, change: Partial<ProgrammeItem> = {}): ProgrammeItem {
  return {
    target,
    weight: 1,
    leastMinutes: 30,
    leastAltitudeRad: toRad(10),
    instrument: TELESCOPE_200,
    ...change,
  };
}

export function inventedProgramme(change: Partial<Programme> = {}): Programme {
  return {
    name: 'Invented programme',
    items: [
      programmeItem(planet('Moon'), { instrument: NAKED_EYE }),
      programmeItem(planet('Jupiter'), { weight: 2 }),
      programmeItem(planet('Saturn'), { weight: 2 }),
      programmeItem(planet('Venus'), { leastMinutes: 15 }),
      programmeItem(galaxy(10.68, 41.27, 3.4, 180), { instrument: BINOCULAR_10X50 }),
      programmeItem(galaxy(83.8, -5.4, 4, 40)),
      programmeItem(galaxy(250.4, 36.5, 5.8, 20)),
      programmeItem(galaxy(202.5, 47.2, 8.4, 11)),
      programmeItem(inventedComet('2027-04-12T00:00:00Z'), { instrument: BINOCULAR_10X50, weight: 3 }),
    ],
    moon: 'dark',
    hours: DUSK_HOURS,
    weekdays: [],
    habit: null,
    ...change,
  };
}
