import { type EveningLight } from '#darkness';
import { type Gate } from './site';
import { localTimeMs, type ZoneClock } from './zoneClock';

export type Twilight = 'sunset' | 'civilDusk' | 'nauticalDusk' | 'astronomicalDusk';

/** When visitors are there: fixed local times, or counted from the fading of the light. */
export type HoursRule = FixedHours | DuskHours;

export interface FixedHours {
  readonly kind: 'fixed';
  /** Local times 'HH:MM' inside the evening; those before noon fall on the next day. */
  readonly start: string;
  readonly end: string;
}

export interface DuskHours {
  readonly kind: 'dusk';
  readonly from: Twilight;
  readonly offsetMinutes: number;
  readonly durationMinutes: number;
  /** Never past this local time; null: no bound. */
  readonly latest: string | null;
}

export interface PublicHours {
  readonly startMs: number;
  readonly endMs: number;
}

/** Public hours of an evening, or in words why there are none. */
export type HoursAnswer =
  { readonly hours: PublicHours; readonly none: null } | { readonly hours: null; readonly none: string };

const MINUTE_MS = 60_000;

/** The public hours of one evening by the rule, kept inside the gate hours. */
export function publicHours(
  rule: HoursRule,
  gate: Gate,
  clock: ZoneClock,
  date: string,
  light: Pick<EveningLight, Twilight>,
): HoursAnswer {
  let startMs: number;
  let endMs: number;
  if (rule.kind === 'fixed') {
    startMs = localTimeMs(clock, date, rule.start);
    endMs = localTimeMs(clock, date, rule.end);
  } else {
    const fades = light[rule.from];
    if (fades === null) {
      return { hours: null, none: `There is no ${TWILIGHT_WORDS[rule.from]} on this evening.` };
    }
    startMs = fades + rule.offsetMinutes * MINUTE_MS;
    endMs = startMs + rule.durationMinutes * MINUTE_MS;
    if (rule.latest !== null) {
      endMs = Math.min(endMs, localTimeMs(clock, date, rule.latest));
      if (endMs <= startMs) {
        return { hours: null, none: `It gets dark only after ${rule.latest}, the latest hour for visitors.` };
      }
    }
  }
  if (gate.opens !== null) startMs = Math.max(startMs, localTimeMs(clock, date, gate.opens));
  if (gate.closes !== null) endMs = Math.min(endMs, localTimeMs(clock, date, gate.closes));
  return endMs > startMs
    ? { hours: { startMs, endMs }, none: null }
    : { hours: null, none: 'The public hours fall outside the gate hours.' };
}

export const TWILIGHT_WORDS: Readonly<Record<Twilight, string>> = {
  sunset: 'sunset',
  civilDusk: 'civil dusk',
  nauticalDusk: 'nautical dusk',
  astronomicalDusk: 'astronomical dusk',
};
