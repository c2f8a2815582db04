import {
  airmass,
  brightestSkyShowing,
  COS_MOON_CLEARANCE,
  darkestSkyHiding,
  limitFromTable,
  skyLuminance,
} from '#darkness';
import { refractionTrueToApparent, SUN_CLEARANCE_RAD, SUN_UP_RAD, trackMagnitude, trackPlace } from '#sky';
import { horizonAltitude } from './horizon';
import { type PublicHours } from './hours';
import { type Season } from './season';
import { azimuth, type PreparedSite, sineAltitude, type SiteInstant } from './siteInstant';

/** Why a target cannot be shown at an instant; 'none' where it can. */
export type Hindrance = 'none' | 'low' | 'skyline' | 'sun' | 'faint';

/** One target seen from one site at one instant: plain numbers, filled again and again. */
export interface Look {
  hindrance: Hindrance;
  sinAltitude: number;
  /** In (-π, π]; NaN where the look ended before it mattered. */
  azimuthRad: number;
  /** Of the sky behind it, nanolambert; NaN where the look ended before the sky mattered. */
  luminanceNl: number;
  /** Magnitudes to spare; NaN where the look ended before it. */
  margin: number;
}

export function createLook(): Look {
  return { hindrance: 'low', sinAltitude: 0, azimuthRad: NaN, luminanceNl: NaN, margin: NaN };
}

/** The rule of isNearRisenSun, for the inner loop: it has the cosine, not the angle. */
const COS_SUN_CLEARANCE = Math.cos(SUN_CLEARANCE_RAD);
const SUN_UP = SUN_UP_RAD;

/** Airmass over the sine of the airless altitude, 0 to 1, ready to be looked up. */
const AIRMASS_STEPS = 2048;
const AIRMASS = Float64Array.from({ length: AIRMASS_STEPS + 2 }, (_, i) => {
  // Evenly spaced in the square root, for the airmass is steep at the horizon.
  const altitude = Math.asin(Math.min(1, (i / AIRMASS_STEPS) ** 2));
  return airmass(altitude + refractionTrueToApparent(altitude));
});

function airmassOfSine(sinAltitude: number): number {
  const at = Math.sqrt(sinAltitude > 0 ? sinAltitude : 0) * AIRMASS_STEPS;
  const before = at | 0;
  const low = AIRMASS[before]!;
  return low + (at - before) * (AIRMASS[before + 1]! - low);
}

const place = new Float64Array(3);
const nodes = new Float64Array(12);

/** What one item of the programme needs through one evening; filled again and again. */
export interface EveningItem {
  index: number;
  isMoon: boolean;
  nearby: boolean;
  sinLeastAltitude: number;
  magnitude: number;
  /** It shows, even at its least altitude, against this sky (nanolambert) and every darker one. */
  darkEnoughNl: number;
  /** It does not show, even overhead, against this sky and any brighter one. */
  tooBrightNl: number;
  /** The geocentric place over the public hours: a cubic in the share of them passed, four numbers an axis. */
  readonly path: Float64Array;
  startMs: number;
  perMs: number;
}

export function createEveningItem(): EveningItem {
  return {
    index: 0,
    isMoon: false,
    nearby: false,
    sinLeastAltitude: 0,
    magnitude: NaN,
    darkEnoughNl: 0,
    tooBrightNl: Infinity,
    path: new Float64Array(12),
    startMs: 0,
    perMs: 0,
  };
}

/**
 * Fills the item of an evening. Its magnitude is taken at the middle of the public hours, fainter by
 * `fainterBy`; its place is the cubic through four places spread over them, within 0.001 arcsec of the track
 * even for the Moon and six hours.
 */
export function setEveningItem(
  item: EveningItem,
  season: Season,
  site: PreparedSite,
  index: number,
  hours: PublicHours,
  fainterBy = 0,
): void {
  const { leastAltitudeRad, target } = season.programme.items[index]!;
  const track = season.tracks[index]!;
  const length = hours.endMs - hours.startMs;
  item.index = index;
  item.isMoon = target.kind === 'solarSystem' && target.body === 'Moon';
  item.nearby = track.nearby;
  item.sinLeastAltitude = Math.sin(leastAltitudeRad);
  item.magnitude = trackMagnitude(track, hours.startMs + length / 2) + fainterBy;
  const { extinctionMagPerAirmass } = site.site.sky;
  const thickest = extinctionMagPerAirmass * airmassOfSine(item.sinLeastAltitude);
  item.darkEnoughNl = brightestSkyShowing(season.limits[index]!, item.magnitude + thickest);
  item.tooBrightNl = darkestSkyHiding(season.limits[index]!, item.magnitude + extinctionMagPerAirmass);
  item.startMs = hours.startMs;
  item.perMs = 1 / length;
  for (let k = 0; k < 4; k++) {
    trackPlace(track, hours.startMs + (length * k) / 3, place);
    for (let axis = 0; axis < 3; axis++) nodes[4 * axis + k] = place[axis]!;
  }
  for (let axis = 0; axis < 3; axis++) {
    const f0 = nodes[4 * axis]!;
    const f1 = nodes[4 * axis + 1]!;
    const f2 = nodes[4 * axis + 2]!;
    const f3 = nodes[4 * axis + 3]!;
    item.path[4 * axis] = f0;
    item.path[4 * axis + 1] = (-11 * f0 + 18 * f1 - 9 * f2 + 2 * f3) / 2;
    item.path[4 * axis + 2] = (9 * (2 * f0 - 5 * f1 + 4 * f2 - f3)) / 2;
    item.path[4 * axis + 3] = (9 * (-f0 + 3 * f1 - 3 * f2 + f3)) / 2;
  }
}

/**
 * Looks at a target from a site at an instant: it is shown when it stands above its least altitude and the
 * site's skyline, clear of the Sun while that is up, and bright enough for its instrument against the sky.
 * Heights are airless, so that what is called clear of the skyline is so in any air. Allocates nothing.
 *
 * @param closely also works out sky and margin where bounds show already whether there is margin; the
 * hindrance is the same either way
 */
export function lookAt(
  look: Look,
  season: Season,
  site: PreparedSite,
  instant: SiteInstant,
  item: EveningItem,
  closely: boolean,
): void {
  const { path } = item;
  const u = (instant.utcMs - item.startMs) * item.perMs;
  let x = path[0]! + u * (path[1]! + u * (path[2]! + u * path[3]!));
  let y = path[4]! + u * (path[5]! + u * (path[6]! + u * path[7]!));
  let z = path[8]! + u * (path[9]! + u * (path[10]! + u * path[11]!));
  if (item.nearby) {
    x -= site.fromAxisAu * instant.cosSidereal;
    y -= site.fromAxisAu * instant.sinSidereal;
    z -= site.fromEquatorAu;
  }
  const inverse = 1 / Math.sqrt(x * x + y * y + z * z);
  x *= inverse;
  y *= inverse;
  z *= inverse;
  const sine = sineAltitude(site, instant, x, y, z);
  look.sinAltitude = sine;
  look.azimuthRad = NaN;
  look.luminanceNl = NaN;
  look.margin = NaN;
  if (sine < item.sinLeastAltitude) {
    look.hindrance = 'low';
    return;
  }
  let bearing = NaN;
  if (sine < site.sinHighest) {
    bearing = azimuth(site, instant, x, y, z);
    look.azimuthRad = bearing;
    if (Math.asin(sine) < horizonAltitude(site.horizon, bearing)) {
      look.hindrance = 'skyline';
      return;
    }
  }
  if (
    instant.sunAltitudeRad > SUN_UP &&
    x * instant.sunX + y * instant.sunY + z * instant.sunZ > COS_SUN_CLEARANCE
  ) {
    look.hindrance = 'sun';
    return;
  }
  // The Moon stands in its own glare; the sky a quarter turn off is what it is seen against.
  const cosMoon = item.isMoon ? 0 : x * instant.moonX + y * instant.moonY + z * instant.moonZ;
  if (!closely) {
    if (instant.darkestNl >= item.tooBrightNl) {
      look.hindrance = 'faint';
      return;
    }
    if (instant.brightestNl <= item.darkEnoughNl && cosMoon <= COS_MOON_CLEARANCE) {
      look.hindrance = 'none';
      return;
    }
  }
  if (Number.isNaN(bearing)) {
    bearing = azimuth(site, instant, x, y, z);
    look.azimuthRad = bearing;
  }
  const luminance = skyLuminance(instant.light, sine, bearing, cosMoon);
  const dimming = site.site.sky.extinctionMagPerAirmass * airmassOfSine(sine);
  look.luminanceNl = luminance;
  look.margin = limitFromTable(season.limits[item.index]!, luminance) - item.magnitude - dimming;
  look.hindrance = look.margin >= 0 ? 'none' : 'faint';
}
