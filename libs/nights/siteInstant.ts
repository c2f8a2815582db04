import { brightestSky, createSkyLight, darkestSky, setSkyLight, type SkyLight } from '#darkness';
import { axialDistances, seasonSidereal, trackPlace, type Track } from '#sky';
import { type Horizon, prepareHorizon } from './horizon';
import { type Season } from './season';
import { type NightSite } from './site';
import { type ZoneClock, zoneClock } from './zoneClock';

/** A site with what does not change from step to step. */
export interface PreparedSite {
  readonly site: NightSite;
  readonly horizon: Horizon;
  /** Sine of the skyline's highest point. */
  readonly sinHighest: number;
  readonly sinLatitude: number;
  readonly cosLatitude: number;
  readonly fromAxisAu: number;
  readonly fromEquatorAu: number;
  readonly clock: ZoneClock;
}

export function prepareSite(site: NightSite): PreparedSite {
  const { fromAxis, fromEquator } = axialDistances(site.observer);
  const horizon = prepareHorizon(site.horizon);
  return {
    site,
    horizon,
    sinHighest: Math.sin(horizon.highestRad),
    sinLatitude: Math.sin(site.observer.latitudeRad),
    cosLatitude: Math.cos(site.observer.latitudeRad),
    fromAxisAu: fromAxis,
    fromEquatorAu: fromEquator,
    clock: zoneClock(site.zone),
  };
}

/** Sun, Moon and sky over one site at one instant: plain numbers, filled again and again. */
export interface SiteInstant {
  utcMs: number;
  cosSidereal: number;
  sinSidereal: number;
  sunAltitudeRad: number;
  /** Unit vector to the Sun, true equator of date. */
  sunX: number;
  sunY: number;
  sunZ: number;
  moonAltitudeRad: number;
  moonIlluminatedFraction: number;
  moonX: number;
  moonY: number;
  moonZ: number;
  readonly light: SkyLight;
  /** No sky away from the Moon is brighter, nanolambert. */
  brightestNl: number;
  /** No sky anywhere is darker, nanolambert. */
  darkestNl: number;
}

export function createSiteInstant(): SiteInstant {
  return {
    utcMs: NaN,
    cosSidereal: 1,
    sinSidereal: 0,
    sunAltitudeRad: 0,
    sunX: 0,
    sunY: 0,
    sunZ: 0,
    moonAltitudeRad: 0,
    moonIlluminatedFraction: 0,
    moonX: 0,
    moonY: 0,
    moonZ: 0,
    light: createSkyLight(),
    brightestNl: Infinity,
    darkestNl: 0,
  };
}

const place = new Float64Array(3);

// Bound once: reaching through a library's door costs in a loop of millions.
const placeOf = trackPlace;
const siderealAt = seasonSidereal;

/** Airless topocentric altitude of a track's body at a site, radians; allocates nothing. */
export function trackAltitude(track: Track, season: Season, site: PreparedSite, utcMs: number): number {
  return limbAltitude(track, season, site, 0, utcMs);
}

/** The same of the upper limb of a body of some radius in au. */
export function limbAltitude(
  track: Track,
  season: Season,
  site: PreparedSite,
  radiusAu: number,
  utcMs: number,
): number {
  const sidereal = siderealAt(season.frame, utcMs) + site.site.observer.longitudeRad;
  const cos = Math.cos(sidereal);
  const sin = Math.sin(sidereal);
  placeOf(track, utcMs, place);
  const along = cos * place[0]! + sin * place[1]! - site.fromAxisAu;
  const across = cos * place[1]! - sin * place[0]!;
  const north = place[2]! - site.fromEquatorAu;
  const up = site.cosLatitude * along + site.sinLatitude * north;
  const distance = Math.sqrt(along * along + across * across + north * north);
  return Math.asin(up / distance) + Math.asin(radiusAu / distance);
}

/** Fills `instant` for a site and a UTC instant inside the season; allocates nothing. */
export function setSiteInstant(
  instant: SiteInstant,
  season: Season,
  site: PreparedSite,
  utcMs: number,
): void {
  const sidereal = siderealAt(season.frame, utcMs) + site.site.observer.longitudeRad;
  const cos = Math.cos(sidereal);
  const sin = Math.sin(sidereal);
  const standX = site.fromAxisAu * cos;
  const standY = site.fromAxisAu * sin;
  const standZ = site.fromEquatorAu;
  instant.utcMs = utcMs;
  instant.cosSidereal = cos;
  instant.sinSidereal = sin;

  placeOf(season.sun, utcMs, place);
  const sunX = place[0]! - standX;
  const sunY = place[1]! - standY;
  const sunZ = place[2]! - standZ;
  const sunDistance = Math.sqrt(sunX * sunX + sunY * sunY + sunZ * sunZ);
  instant.sunX = sunX / sunDistance;
  instant.sunY = sunY / sunDistance;
  instant.sunZ = sunZ / sunDistance;
  instant.sunAltitudeRad = Math.asin(sineAltitude(site, instant, instant.sunX, instant.sunY, instant.sunZ));
  const sunAzimuth = azimuth(site, instant, instant.sunX, instant.sunY, instant.sunZ);

  placeOf(season.moon, utcMs, place);
  const moonX = place[0]! - standX;
  const moonY = place[1]! - standY;
  const moonZ = place[2]! - standZ;
  const moonDistance = Math.sqrt(moonX * moonX + moonY * moonY + moonZ * moonZ);
  instant.moonX = moonX / moonDistance;
  instant.moonY = moonY / moonDistance;
  instant.moonZ = moonZ / moonDistance;
  instant.moonAltitudeRad = Math.asin(
    sineAltitude(site, instant, instant.moonX, instant.moonY, instant.moonZ),
  );
  // Meeus 1998, chapter 48: the phase angle from the elongation and the two distances.
  const cosElongation =
    instant.sunX * instant.moonX + instant.sunY * instant.moonY + instant.sunZ * instant.moonZ;
  const phase = Math.atan2(
    sunDistance * Math.sqrt(Math.max(0, 1 - cosElongation * cosElongation)),
    moonDistance - sunDistance * cosElongation,
  );
  instant.moonIlluminatedFraction = (1 + Math.cos(phase)) / 2;
  setSkyLight(
    instant.light,
    site.site.sky,
    instant.sunAltitudeRad,
    sunAzimuth,
    instant.moonAltitudeRad,
    phase,
    moonDistance,
  );
  instant.brightestNl = brightestSky(instant.light);
  instant.darkestNl = darkestSky(instant.light);
}

/** Sine of the altitude of a unit vector of the true equator of date. */
export function sineAltitude(
  site: PreparedSite,
  instant: SiteInstant,
  x: number,
  y: number,
  z: number,
): number {
  return site.cosLatitude * (instant.cosSidereal * x + instant.sinSidereal * y) + site.sinLatitude * z;
}

/** Azimuth of a vector of the true equator of date, from north through east, in (-π, π]. */
export function azimuth(site: PreparedSite, instant: SiteInstant, x: number, y: number, z: number): number {
  const towardsMeridian = instant.cosSidereal * x + instant.sinSidereal * y;
  const east = instant.cosSidereal * y - instant.sinSidereal * x;
  return Math.atan2(east, site.cosLatitude * z - site.sinLatitude * towardsMeridian);
}
