import {
  compassPoint,
  fromSpherical,
  place,
  positionAngle,
  separation,
  type SkyTarget,
  toDeg,
  toRad,
} from '#sky';

/** How a comet or asteroid moves across the sky at an instant, and where a comet's tail points. */
export interface BodyMotion {
  readonly arcminPerHour: number;
  /** Direction of the motion, from north through east. */
  readonly positionAngleDeg: number;
  /** The same in compass words. */
  readonly direction: string;
  /** Direction straight away from the Sun, in which a comet's tail points; null for an asteroid. */
  readonly tailPositionAngleDeg: number | null;
  readonly words: string;
}

const HALF_HOUR_MS = 1_800_000;
const SUN: SkyTarget = { kind: 'solarSystem', name: 'Sun', body: 'Sun' };
/** Slower than this nobody sees it move in an evening. */
const SEEN_ARCMIN_PER_HOUR = 0.05;

/**
 * A body's motion over the hour around a UTC instant, as seen from the Earth's centre, among the stars of J2000.
 * A tail is taken to point straight away from the Sun; those of dust lag behind by some degrees (common practice).
 */
export function bodyMotion(moving: SkyTarget, kind: 'comet' | 'asteroid', utcMs: number): BodyMotion {
  const from = place(moving, utcMs - HALF_HOUR_MS, null).astrometric;
  const to = place(moving, utcMs + HALF_HOUR_MS, null).astrometric;
  const way = separation(fromSpherical(from.raRad, from.decRad), fromSpherical(to.raRad, to.decRad));
  const arcminPerHour = toDeg(way) * 60;
  const positionAngleDeg = toDeg(positionAngle(from.raRad, from.decRad, to.raRad, to.decRad));
  const direction = compassPoint(toRad(positionAngleDeg), 16).word;
  const tailPositionAngleDeg = kind === 'comet' ? awayFromSunDeg(moving, utcMs) : null;
  const moves =
    arcminPerHour < SEEN_ARCMIN_PER_HOUR
      ? 'It stays where it is among the stars through an evening'
      : `It moves ${rateWords(arcminPerHour)} an hour towards the ${direction}`;
  const tail =
    tailPositionAngleDeg === null
      ? ''
      : `; a tail would point ${compassPoint(toRad(tailPositionAngleDeg), 16).word} (position angle ${tailPositionAngleDeg.toFixed(0)} degrees), away from the Sun`;
  return { arcminPerHour, positionAngleDeg, direction, tailPositionAngleDeg, words: `${moves}${tail}.` };
}

function awayFromSunDeg(moving: SkyTarget, utcMs: number): number {
  const { raRad, decRad } = place(moving, utcMs, null).astrometric;
  const sun = place(SUN, utcMs, null).astrometric;
  return (toDeg(positionAngle(raRad, decRad, sun.raRad, sun.decRad)) + 180) % 360;
}

function rateWords(arcmin: number): string {
  if (arcmin < 1) return `${(arcmin * 60).toFixed(0)} arcsec`;
  if (arcmin < 60) return `${arcmin < 9.95 ? arcmin.toFixed(1) : arcmin.toFixed(0)} arcmin`;
  return `${(arcmin / 60).toFixed(1)} degrees`;
}
