import { compassPoint, fromSpherical, place, positionAngle, separation, toDeg } from '#sky';
import { type ChartOrder } from './chartFor';

const HOUR_MS = 3_600_000;
/** Slower than this nobody sees it move in an evening, arcminutes an hour. */
const LEAST_ARCMIN = 0.05;

/** How far a moving target goes in an hour, and which way; nothing for what stands still. */
export function motionNote({ target, observer, utcMs }: ChartOrder): string[] {
  if (target.sky.kind === 'fixed') return [];
  const [from, to] = [-HOUR_MS / 2, HOUR_MS / 2].map(
    (shift) => place(target.sky, utcMs + shift, observer).astrometric,
  );
  const arcmin =
    toDeg(separation(fromSpherical(from!.raRad, from!.decRad), fromSpherical(to!.raRad, to!.decRad))) * 60;
  if (arcmin < LEAST_ARCMIN) return [];
  const angle = positionAngle(from!.raRad, from!.decRad, to!.raRad, to!.decRad);
  const side = compassPoint(angle, 8).word;
  return [`Moves ${lengthWords(arcmin)} an hour towards the ${side}.`];
}

/** "12″", "2.3′", "1.4°". */
function lengthWords(arcmin: number): string {
  if (arcmin < 1) return `${Math.round(arcmin * 60)}″`;
  if (arcmin < 60) return `${arcmin < 10 ? arcmin.toFixed(1) : arcmin.toFixed(0)}′`;
  return `${(arcmin / 60).toFixed(1)}°`;
}
