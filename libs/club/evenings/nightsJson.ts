import { type Interval, type JudgedEvening, type ShowingRange } from '#nights';
import { type Ranking } from './seasonSearch';

/** A ranking as other programs read it: instants as ISO UTC. */
export interface NightsJson {
  readonly searched: Ranking['searched'];
  readonly evenings: readonly EveningJson[];
  readonly closed: Ranking['closed'];
  readonly habit: Ranking['habit'];
}

export function toNightsJson({ searched, evenings, closed, habit }: Ranking): NightsJson {
  return { searched, evenings: evenings.map(eveningJson), closed, habit };
}

/** One judged evening as other programs read it. */
export type EveningJson = ReturnType<typeof eveningJson>;

/** One judged evening, instants as ISO UTC. */
export function eveningJson({ publicHours, showings, ...evening }: JudgedEvening) {
  return {
    ...evening,
    publicHours: publicHours && { start: iso(publicHours.startMs), end: iso(publicHours.endMs) },
    showings: showings.map(({ intervals, best, range, ...showing }) => ({
      ...showing,
      intervals: intervals.map(isoInterval),
      best: best && { at: iso(best.utcMs), ...withoutInstant(best) },
      range: range && rangeJson(range),
    })),
  };
}

function withoutInstant({
  altitudeDeg,
  azimuthDeg,
  skyBrightness,
  margin,
}: NonNullable<JudgedEvening['showings'][number]['best']>) {
  return { altitudeDeg, azimuthDeg, skyBrightness, margin };
}

function rangeJson({ ifBrighter, ifFainter, ...range }: ShowingRange) {
  return {
    ...range,
    ifBrighter: { ...ifBrighter, intervals: ifBrighter.intervals.map(isoInterval) },
    ifFainter: { ...ifFainter, intervals: ifFainter.intervals.map(isoInterval) },
  };
}

function isoInterval({ startMs, endMs }: Interval) {
  return { start: iso(startMs), end: iso(endMs) };
}

function iso(utcMs: number): string {
  return new Date(Math.round(utcMs)).toISOString();
}
