import { type EveningLight, eveningLight } from '#darkness';
import { KM_PER_AU, RADIUS_KM } from '#sky';
import { type Season } from './season';
import { type PreparedSite, trackAltitude, trackDistance } from './siteInstant';

/** Twilights, moonrise and moonset of an evening from the season's tracks. */
export function seasonEveningLight(
  season: Season,
  site: PreparedSite,
  fromMs: number,
  toMs: number,
): EveningLight {
  return eveningLight(
    (utcMs) => trackAltitude(season.sun, season, site, utcMs),
    (utcMs) => trackAltitude(season.moon, season, site, utcMs),
    (utcMs) => Math.asin(RADIUS_KM.Moon / KM_PER_AU / trackDistance(season.moon, season, site, utcMs)),
    fromMs,
    toMs,
  );
}
