import { type EveningLight, eveningLight } from '#darkness';
import { KM_PER_AU, RADIUS_KM } from '#sky';
import { type Season } from './season';
import { limbAltitude, type PreparedSite, trackAltitude } from './siteInstant';

const MOON_RADIUS_AU = RADIUS_KM.Moon / KM_PER_AU;

/** Twilights, moonrise and moonset of an evening from the season's tracks. */
export function seasonEveningLight(
  season: Season,
  site: PreparedSite,
  fromMs: number,
  toMs: number,
): EveningLight {
  return eveningLight(
    (utcMs) => trackAltitude(season.sun, season, site, utcMs),
    // The upper limb at once: one look at the track serves altitude and semidiameter.
    (utcMs) => limbAltitude(season.moon, season, site, MOON_RADIUS_AU, utcMs),
    () => 0,
    fromMs,
    toMs,
  );
}
