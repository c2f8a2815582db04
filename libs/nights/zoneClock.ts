import { IANAZone } from 'luxon';

const DAY_MS = 86_400_000;
const MINUTE_MS = 60_000;

/** A zone's clock, which remembers the noons it was asked for: a season asks for each of them many times. */
export interface ZoneClock {
  readonly zone: string;
  /** UTC instant of local noon on a date 'YYYY-MM-DD'. */
  readonly noonMs: (date: string) => number;
  /** Minutes that local time is ahead of UTC at an instant. */
  readonly offsetMinutes: (utcMs: number) => number;
}

/** Clocks already made: the rules of a zone do not change while the program runs. */
const clocks = new Map<string, ZoneClock>();

/** The clock of an IANA zone, which must exist. */
export function zoneClock(zone: string): ZoneClock {
  const known = clocks.get(zone);
  if (known !== undefined) return known;
  const made = makeClock(zone);
  clocks.set(zone, made);
  return made;
}

function makeClock(zone: string): ZoneClock {
  const rules = IANAZone.create(zone);
  const noons = new Map<string, number>();
  const offsetMinutes = (utcMs: number) => rules.offset(utcMs);
  return {
    zone,
    offsetMinutes,
    noonMs: (date) => {
      const known = noons.get(date);
      if (known !== undefined) return known;
      const noon = localInstant(Date.parse(date) + DAY_MS / 2, offsetMinutes);
      noons.set(date, noon);
      return noon;
    },
  };
}

/**
 * The UTC instant at which the local clock shows a reading, given as if it were UTC. Of a reading that comes
 * twice the first is taken, and one that a clock change skips as if the clock had not yet changed.
 */
function localInstant(reading: number, offsetMinutes: (utcMs: number) => number): number {
  const before = offsetMinutes(reading - DAY_MS);
  const first = reading - before * MINUTE_MS;
  if (offsetMinutes(first) === before) return first;
  const after = offsetMinutes(reading + DAY_MS);
  const second = reading - after * MINUTE_MS;
  return offsetMinutes(second) === after ? second : first;
}

/**
 * The UTC instant of a local time 'HH:MM' inside an evening, which runs from local noon on its date to the
 * next local noon: times before noon belong to the next day. A time that a clock change skips falls after
 * the gap.
 */
export function localTimeMs(clock: ZoneClock, date: string, time: string): number {
  const minutes = Number(time.slice(0, 2)) * 60 + Number(time.slice(3));
  const sinceNoon = minutes >= 720 ? minutes - 720 : minutes + 720;
  const noon = clock.noonMs(date);
  const next = clock.noonMs(nextDate(date));
  if (next - noon === DAY_MS) return noon + sinceNoon * MINUTE_MS;
  return localInstant(Date.parse(date) + DAY_MS / 2 + sinceNoon * MINUTE_MS, clock.offsetMinutes);
}

/** UTC instants of an evening's two local noons. */
export function eveningSpan(
  clock: ZoneClock,
  date: string,
): { readonly fromMs: number; readonly toMs: number } {
  return { fromMs: clock.noonMs(date), toMs: clock.noonMs(nextDate(date)) };
}

function nextDate(date: string): string {
  return new Date(Date.parse(date) + DAY_MS).toISOString().slice(0, 10);
}
