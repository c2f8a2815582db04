import type { LocalSky } from './horizon';
import type { SkyPoint } from './projection';
import type { ChartView } from './request';

/**
 * What the circles of a mount read when it points at a place, for the date and hour of the sky: the equatorial
 * pair and the level pair, radians. The hour angle runs west from the meridian, from -π to π. Aberration, a third
 * of an arcminute, is left out: no circle shows it.
 */
export interface CircleReadings {
  readonly hourAngleRad: number;
  readonly decRad: number;
  readonly altitudeRad: number;
  readonly azimuthRad: number;
}

/** The readings for a place from its altitude and azimuth (the spherical triangle pole, zenith, place). */
export function circleReadings(sky: LocalSky, view: ChartView, place: SkyPoint): CircleReadings {
  const { altitudeRad, azimuthRad } = sky.altAz(place);
  const sinLat = Math.sin(view.latitudeRad);
  const cosLat = Math.cos(view.latitudeRad);
  const up = Math.sin(altitudeRad);
  const north = Math.cos(altitudeRad) * Math.cos(azimuthRad);
  const west = -Math.cos(altitudeRad) * Math.sin(azimuthRad);
  const sinDec = sinLat * up + cosLat * north;
  return {
    hourAngleRad: Math.atan2(west, cosLat * up - sinLat * north),
    decRad: Math.asin(Math.max(-1, Math.min(1, sinDec))),
    altitudeRad,
    azimuthRad,
  };
}
