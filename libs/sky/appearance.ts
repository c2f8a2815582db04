import { type Vector, dot, norm, separation, subtract } from './vector';

/** Lit fraction of a sphere's disc at a phase angle in radians (Meeus 1998, chapter 41). */
export function illuminatedFraction(phaseAngleRad: number): number {
  return (1 + Math.cos(phaseAngleRad)) / 2;
}

/** Angle Sun - body - observer in [0, π] from heliocentric and geocentric vectors of the body. */
export function phaseAngle(fromSun: Vector, fromObserver: Vector): number {
  return separation(fromSun, fromObserver);
}

/** Angular diameter in radians of a sphere, exact also when it is near. */
export function angularDiameter(radius: number, distance: number): number {
  return 2 * Math.asin(Math.min(1, radius / distance));
}

/** Position angle of `to` seen from `from`, from north through east in [0, 2π), all radians. */
export function positionAngle(
  fromRaRad: number,
  fromDecRad: number,
  toRaRad: number,
  toDecRad: number,
): number {
  const da = toRaRad - fromRaRad;
  const angle = Math.atan2(
    Math.cos(toDecRad) * Math.sin(da),
    Math.sin(toDecRad) * Math.cos(fromDecRad) - Math.cos(toDecRad) * Math.sin(fromDecRad) * Math.cos(da),
  );
  return angle < 0 ? angle + 2 * Math.PI : angle;
}

/** Parallactic angle in (-π, π]: position angle of the zenith (Meeus 1998, chapter 14), all radians. */
export function parallacticAngle(hourAngleRad: number, decRad: number, latitudeRad: number): number {
  return Math.atan2(
    Math.sin(hourAngleRad) * Math.cos(latitudeRad),
    Math.sin(latitudeRad) * Math.cos(decRad) -
      Math.cos(latitudeRad) * Math.sin(decRad) * Math.cos(hourAngleRad),
  );
}

/** Planetocentric latitude of the point under `viewer`, radians, from the planet's pole direction. */
export function subLatitude(pole: Vector, planet: Vector, viewer: Vector): number {
  const towards = subtract(viewer, planet);
  return Math.asin(Math.max(-1, Math.min(1, dot(pole, towards) / norm(towards))));
}
