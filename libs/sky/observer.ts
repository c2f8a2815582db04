import { type Vector } from './vector';

/** A place on the Earth: geodetic (WGS84) latitude and east longitude in radians, metres above sea level. */
export interface Observer {
  readonly latitudeRad: number;
  readonly longitudeRad: number;
  readonly elevationM: number;
}

export const KM_PER_AU = 149_597_870.7;
/** WGS84 ellipsoid: equatorial radius in km and flattening. */
const EARTH_RADIUS_KM = 6378.137;
const FLATTENING = 1 / 298.257223563;

/** The observer's distance from the Earth's axis and from its equatorial plane, au (WGS84). */
export function axialDistances(observer: Observer): {
  readonly fromAxis: number;
  readonly fromEquator: number;
} {
  const sin = Math.sin(observer.latitudeRad);
  const cos = Math.cos(observer.latitudeRad);
  const squeeze = (1 - FLATTENING) ** 2;
  const c = 1 / Math.sqrt(cos * cos + squeeze * sin * sin);
  const heightKm = observer.elevationM / 1000;
  return {
    fromAxis: ((EARTH_RADIUS_KM * c + heightKm) * cos) / KM_PER_AU,
    fromEquator: ((EARTH_RADIUS_KM * squeeze * c + heightKm) * sin) / KM_PER_AU,
  };
}

/** Geocentric vector of the observer, au, true equator and equinox of date, from the local sidereal angle. */
export function observerVector(observer: Observer, localSiderealRad: number): Vector {
  const { fromAxis, fromEquator } = axialDistances(observer);
  return [fromAxis * Math.cos(localSiderealRad), fromAxis * Math.sin(localSiderealRad), fromEquator];
}
