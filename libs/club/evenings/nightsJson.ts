import { type JudgedEvening } from '#nights';
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
    showings: showings.map(({ intervals, best, ...showing }) => ({
      ...showing,
      intervals: intervals.map(({ startMs, endMs }) => ({ start: iso(startMs), end: iso(endMs) })),
      best: best && { at: iso(best.utcMs), ...withoutInstant(best) },
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

function iso(utcMs: number): string {
  return new Date(Math.round(utcMs)).toISOString();
}
