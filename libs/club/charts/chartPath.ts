import { type PathPoint } from '#charts';
import { fromSpherical, type Observer, place, separation, type SkyTarget, toDeg } from '#sky';
import { DateTime } from 'luxon';

const HOUR_MS = 3_600_000;
/** Round steps between the ticks of a path, hours. */
const STEPS_HOURS = [1 / 6, 0.5, 1, 3, 6, 24, 48, 120] as const;
/** A tick should be this share of the field from the next, to be told apart. */
const LEAST_SHARE = 0.05;
const TICKS_EACH_WAY = 3;

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
): PathPoint[] {
  if (target.kind === 'fixed') return [];
  const at = (ms: number) => place(target, ms, observer).astrometric;
  const direction = (ms: number) => {
    const { raRad, decRad } = at(ms);
    return fromSpherical(raRad, decRad);
  };
  const degreesAnHour = toDeg(separation(direction(utcMs - HOUR_MS), direction(utcMs + HOUR_MS))) / 2;
  const step = STEPS_HOURS.find((hours) => hours * degreesAnHour >= LEAST_SHARE * fieldDeg);
  if (step === undefined) return [];
  const first = roundTick(utcMs, zone, step);
  return Array.from({ length: 2 * TICKS_EACH_WAY + 1 }, (_, i) => {
    const ms = first + (i - TICKS_EACH_WAY) * step * HOUR_MS;
    const { raRad, decRad } = at(ms);
    const local = DateTime.fromMillis(ms, { zone });
    return { at: local.toFormat(step < 24 ? 'HH:mm' : 'd LLL'), utcMs: ms, raRad, decRad };
  });
}

/** The round local time nearest to an instant; for steps of days, local midnight. */
function roundTick(utcMs: number, zone: string, stepHours: number): number {
  const local = DateTime.fromMillis(utcMs, { zone });
  const midnight = local.startOf('day').toMillis();
  const step = Math.min(stepHours, 24) * HOUR_MS;
  return midnight + Math.round((utcMs - midnight) / step) * step;
}
