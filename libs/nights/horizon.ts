import { DEG, wrapTwoPi } from '#sky';

/** One measured point of a site's skyline. */
export interface HorizonPoint {
  readonly azimuthDeg: number;
  readonly altitudeDeg: number;
}

/** A skyline ready for use: straight between its points, closed around the compass. */
export interface Horizon {
  /** Radians, rising, the first point repeated a turn later. */
  readonly azimuths: Float64Array;
  readonly altitudes: Float64Array;
  readonly highestRad: number;
  /** Highest altitude in each whole degree of azimuth. */
  readonly highestByDegree: Float64Array;
}

/** The open sea: nothing above the mathematical horizon. */
export const FLAT_HORIZON: readonly HorizonPoint[] = [];

/** Prepares a skyline from points that run once around from north through east; none means flat. */
export function prepareHorizon(points: readonly HorizonPoint[]): Horizon {
  const around = points.length === 0 ? [{ azimuthDeg: 0, altitudeDeg: 0 }] : points;
  const first = around[0]!;
  const closed = [...around, { azimuthDeg: first.azimuthDeg + 360, altitudeDeg: first.altitudeDeg }];
  const azimuths = Float64Array.from(closed, (point) => point.azimuthDeg * DEG);
  const altitudes = Float64Array.from(closed, (point) => point.altitudeDeg * DEG);
  const highestByDegree = new Float64Array(360);
  for (let degree = 0; degree < 360; degree++) {
    // Highest of a broken line over a degree: its ends, and the points that fall inside.
    let highest = Math.max(
      interpolate(azimuths, altitudes, degree * DEG),
      interpolate(azimuths, altitudes, (degree + 1) * DEG),
    );
    for (const point of around) {
      if (Math.floor(point.azimuthDeg) % 360 === degree) highest = Math.max(highest, point.altitudeDeg * DEG);
    }
    highestByDegree[degree] = highest;
  }
  return { azimuths, altitudes, highestRad: Math.max(...altitudes), highestByDegree };
}

/** Altitude of the skyline at an azimuth, both in radians. */
export function horizonAltitude(horizon: Horizon, azimuthRad: number): number {
  return interpolate(horizon.azimuths, horizon.altitudes, azimuthRad);
}

/** An upper bound of the skyline between two azimuths at most half a turn apart, radians. */
export function highestBetween(horizon: Horizon, fromRad: number, toRad: number): number {
  const span = wrapTwoPi(toRad - fromRad);
  const [start, length] = span <= Math.PI ? [fromRad, span] : [toRad, 2 * Math.PI - span];
  const first = Math.floor(wrapTwoPi(start) / DEG);
  const count = Math.ceil(length / DEG) + 1;
  let highest = -Infinity;
  for (let i = 0; i <= count; i++) highest = Math.max(highest, horizon.highestByDegree[(first + i) % 360]!);
  return highest;
}

function interpolate(azimuths: Float64Array, altitudes: Float64Array, azimuthRad: number): number {
  const start = azimuths[0]!;
  const azimuth = start + wrapTwoPi(azimuthRad - start);
  let low = 0;
  let high = azimuths.length - 1;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (azimuths[middle]! <= azimuth) low = middle;
    else high = middle;
  }
  const width = azimuths[high]! - azimuths[low]!;
  const part = width > 0 ? (azimuth - azimuths[low]!) / width : 0;
  return altitudes[low]! + part * (altitudes[high]! - altitudes[low]!);
}
