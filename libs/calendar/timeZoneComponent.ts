import { DateTime, IANAZone } from 'luxon';

const DAY_MS = 86_400_000;
const MINUTE_MS = 60_000;

/** How far before the first event the rule in force then is looked for: every yearly rule falls inside. */
const LOOK_BACK_MS = 400 * DAY_MS;
/** Shorter than any two changes of a zone's clocks lie apart, so that none is stepped over. */
const STEP_MS = 7 * DAY_MS;

interface ClockChange {
  readonly utcMs: number;
  readonly fromMinutes: number;
  readonly toMinutes: number;
}

/**
 * The VTIMEZONE of a zone (RFC 5545, 3.6.5), lines ended by CRLF. Each change of its clocks from before the
 * first instant to the last one is told by itself, without a recurrence, so that past and future rules of the
 * time-zone database come out exactly. Instants are UTC epoch milliseconds. Throws a RangeError for an unknown
 * zone.
 */
export function timeZoneComponent(zone: string, firstMs: number, lastMs: number): string {
  const clock = IANAZone.create(zone);
  if (!clock.isValid) throw new RangeError(`The zone was "${zone}"; give the IANA name of a time zone.`);
  const changes = clockChanges(clock, firstMs - LOOK_BACK_MS, lastMs);
  const standard = standardOffsets(clock);
  const first = changes[0];
  const observances =
    first === undefined
      ? [steadyClock(clock.offset(firstMs))]
      : [
          ...(first.utcMs > firstMs ? [steadyClock(first.fromMinutes)] : []),
          ...changes.map((change) => observance(zone, change, standard(change))),
        ];
  return ['BEGIN:VTIMEZONE', `TZID:${zone}`, ...observances.flat(), 'END:VTIMEZONE', ''].join('\r\n');
}

/** Changes of the offset between two instants, earliest first, each to the minute. */
function clockChanges(clock: IANAZone, fromMs: number, toMs: number): ClockChange[] {
  const changes: ClockChange[] = [];
  let before = Math.floor(fromMs / MINUTE_MS) * MINUTE_MS;
  const end = Math.ceil(toMs / MINUTE_MS) * MINUTE_MS;
  while (before < end) {
    const after = Math.min(before + STEP_MS, end);
    if (clock.offset(before) !== clock.offset(after)) {
      const utcMs = changeBetween(clock, before, after);
      changes.push({
        utcMs,
        fromMinutes: clock.offset(utcMs - MINUTE_MS),
        toMinutes: clock.offset(utcMs),
      });
    }
    before = after;
  }
  return changes;
}

/** The first whole minute at which the later offset holds. */
function changeBetween(clock: IANAZone, beforeMs: number, afterMs: number): number {
  const old = clock.offset(beforeMs);
  let low = beforeMs;
  let high = afterMs;
  while (high - low > MINUTE_MS) {
    const middle = Math.floor((low + high) / 2 / MINUTE_MS) * MINUTE_MS;
    if (clock.offset(middle) === old) low = middle;
    else high = middle;
  }
  return high;
}

/** Tells whether a change is one back to standard time: the smaller offset of its year. */
function standardOffsets(clock: IANAZone): (change: ClockChange) => boolean {
  return ({ utcMs, toMinutes }) => {
    const year = new Date(utcMs).getUTCFullYear();
    const winter = clock.offset(Date.UTC(year, 0, 15));
    const summer = clock.offset(Date.UTC(year, 6, 15));
    return toMinutes <= Math.min(winter, summer);
  };
}

/** A clock that does not change in the time that matters. */
function steadyClock(offsetMinutes: number): string[] {
  const offset = offsetText(offsetMinutes);
  return [
    'BEGIN:STANDARD',
    'DTSTART:19700101T000000',
    `TZOFFSETFROM:${offset}`,
    `TZOFFSETTO:${offset}`,
    'END:STANDARD',
  ];
}

/** The onset is told in the local time that held before it (RFC 5545, 3.6.5). */
function observance(
  zone: string,
  { utcMs, fromMinutes, toMinutes }: ClockChange,
  standard: boolean,
): string[] {
  const kind = standard ? 'STANDARD' : 'DAYLIGHT';
  const onset = DateTime.fromMillis(utcMs + fromMinutes * MINUTE_MS, { zone: 'utc' });
  const name = DateTime.fromMillis(utcMs, { zone, locale: 'en-US' }).offsetNameShort ?? '';
  return [
    `BEGIN:${kind}`,
    `DTSTART:${onset.toFormat("yyyyMMdd'T'HHmmss")}`,
    `TZOFFSETFROM:${offsetText(fromMinutes)}`,
    `TZOFFSETTO:${offsetText(toMinutes)}`,
    ...(name === '' ? [] : [`TZNAME:${name}`]),
    `END:${kind}`,
  ];
}

function offsetText(minutes: number): string {
  const size = Math.abs(minutes);
  const two = (value: number): string => String(value).padStart(2, '0');
  return `${minutes < 0 ? '-' : '+'}${two(Math.floor(size / 60))}${two(size % 60)}`;
}
