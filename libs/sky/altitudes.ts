import { angularDiameter } from './appearance';
import { KM_PER_AU, type Observer, observerVector } from './observer';
import { aberrate, earthFrame, type Horizontal, horizontalPlace } from './place';
import { apparentMoon, RADIUS_KM } from './solarSystem';
import { siderealAngle } from './time';
import { norm, rotate, scale, subtract, type Vector } from './vector';

/** Apparent topocentric Sun: its horizontal place, airless, as a function of the UTC instant. */
export function sunHorizontal(observer: Observer): (utcMs: number) => Horizontal {
  return (utcMs) => {
    const { earth, toDate } = earthFrame(utcMs);
    return seenFrom(observer, rotate(toDate, aberrate(scale(earth.position, -1), earth.velocity)), utcMs)
      .horizontal;
  };
}

/** Airless topocentric altitude of the Sun's centre in radians, as a function of the UTC instant. */
export function sunAltitude(observer: Observer): (utcMs: number) => number {
  const horizontal = sunHorizontal(observer);
  return (utcMs) => horizontal(utcMs).altitudeRad;
}

/** Airless topocentric altitude of the Moon's centre in radians, as a function of the UTC instant. */
export function moonAltitude(observer: Observer): (utcMs: number) => number {
  return (utcMs) => seenFrom(observer, apparentMoon(utcMs), utcMs).horizontal.altitudeRad;
}

/** Topocentric semidiameter of the Moon in radians, as a function of the UTC instant. */
export function moonSemidiameter(observer: Observer): (utcMs: number) => number {
  return (utcMs) =>
    angularDiameter(RADIUS_KM.Moon / KM_PER_AU, seenFrom(observer, apparentMoon(utcMs), utcMs).distance) / 2;
}

function seenFrom(
  observer: Observer,
  geocentricOfDate: Vector,
  utcMs: number,
): { readonly horizontal: Horizontal; readonly distance: number } {
  const localSidereal = siderealAngle(utcMs) + observer.longitudeRad;
  const seen = subtract(geocentricOfDate, observerVector(observer, localSidereal));
  return { horizontal: horizontalPlace(seen, localSidereal, observer.latitudeRad), distance: norm(seen) };
}
