import { type PathPoint } from '#charts';
import { fromSpherical, type Observer, place, separation, type SkyTarget, toDeg } from '#sky';
import { DateTime } from 'luxon';

const HOUR_MS = 3_600_000;
/** Round steps between the ticks of a path, hours. */
const STEPS_HOURS = [1 / 6, 0.5, 1, 3, 6, 24, 48, 120] as const;
/** A tick should be this share of the field from the next, to be told apart. */
const LEAST_SHARE = 0.05;
/** And at least this many of the target's own diameters, so that the disc does not cover the first. */
const LEAST_DIAMETERS = 0.6;
const TICKS_EACH_WAY = 3;
/** Places between two ticks, so that a path bends as it does in the sky. */
const BETWEEN = 3;

/**
 * Where a moving target passes on a chart: ticks at round local times (or dates, where it is slow) on both
 * sides of the chart's instant; none for what stands still or creeps.
 */
export function chartPath(
  target: SkyTarget,
  observer: Observer,
  zone: string,
  utcMs: number,
  fieldDeg: number,
  diameterDeg: number,
): PathPoint[] {
  if (target.kind === 'fixed') return [];
  const at = (ms: number) => place(target, ms, observer).astrometric;
  const direction = (ms: number) => {
    const { raRad, decRad } = at(ms);
    return fromSpherical(raRad, decRad);
  };
  const degreesAnHour = toDeg(separation(direction(utcMs - HOUR_MS), direction(utcMs + HOUR_MS))) / 2;
  const least = Math.max(LEAST_SHARE * fieldDeg, LEAST_DIAMETERS * diameterDeg);
  const step = STEPS_HOURS.find((hours) => hours * degreesAnHour >= least);
  if (step === undefined) return [];
  const first = roundTick(utcMs, zone, step);
  const parts = BETWEEN + 1;
  return Array.from({ length: 2 * TICKS_EACH_WAY * parts + 1 }, (_, i) => {
    const ms = first + (i / parts - TICKS_EACH_WAY) * step * HOUR_MS;
    const point = pathPoint(target, observer, zone, ms, step < 24 ? 'HH:mm' : 'd LLL');
    return i % parts === 0 ? point : { ...point, at: '' };
  });
}

/** Where a target stands at an instant, with its local time in Luxon's `format`. */
export function pathPoint(
  target: SkyTarget,
  observer: Observer,
  zone: string,
  utcMs: number,
  format: string,
): PathPoint {
  const { raRad, decRad } = place(target, utcMs, observer).astrometric;
  return { at: DateTime.fromMillis(utcMs, { zone }).toFormat(format), utcMs, raRad, decRad };
}

/** The round local time nearest to an instant; for steps of days, local midnight. */
function roundTick(utcMs: number, zone: string, stepHours: number): number {
  const local = DateTime.fromMillis(utcMs, { zone });
  const midnight = local.startOf('day').toMillis();
  const step = Math.min(stepHours, 24) * HOUR_MS;
  return midnight + Math.round((utcMs - midnight) / step) * step;
}
