import fc from 'fast-check';
import { DateTime } from 'luxon';
import { eveningSpan, localTimeMs, zoneClock } from './zoneClock';

const zones = [
  'Europe/Zurich',
  'America/St_Johns',
  'Australia/Lord_Howe',
  'Pacific/Auckland',
  'America/Santiago',
  'Asia/Kathmandu',
  'UTC',
];

describe('localTimeMs', () => {
  it('reads every clock as Luxon does, over all changes of two years', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...zones),
        fc.integer({ min: 0, max: 730 }),
        fc.integer({ min: 0, max: 1439 }),
        (zone, day, minute) => {
          const date = new Date(Date.UTC(2026, 0, 1 + day)).toISOString().slice(0, 10);
          const time = `${String(Math.floor(minute / 60)).padStart(2, '0')}:${String(minute % 60).padStart(2, '0')}`;
          const on = DateTime.fromISO(date, { zone }).plus({ days: minute < 720 ? 1 : 0 });
          const expected = DateTime.fromObject(
            {
              year: on.year,
              month: on.month,
              day: on.day,
              hour: Math.floor(minute / 60),
              minute: minute % 60,
            },
            { zone },
          );
          const found = DateTime.fromMillis(localTimeMs(zoneClock(zone), date, time), { zone });
          expect(found.toFormat('yyyy-MM-dd HH:mm')).toBe(expected.toFormat('yyyy-MM-dd HH:mm'));
        },
      ),
      { numRuns: 3000 },
    );
  });

  it('takes a time that a change skips after the gap, and the first of one that comes twice', () => {
    const clock = zoneClock('Europe/Zurich');
    // European Union summer time 2027: 28 March and 31 October, 01:00 UTC.
    expect(new Date(localTimeMs(clock, '2027-03-27', '02:30')).toISOString()).toBe(
      '2027-03-28T01:30:00.000Z',
    );
    expect(new Date(localTimeMs(clock, '2027-10-30', '02:30')).toISOString()).toBe(
      '2027-10-31T00:30:00.000Z',
    );
  });
});

describe('eveningSpan', () => {
  it('lasts 23 and 25 hours over the changes', () => {
    const hours = (date: string) => {
      const { fromMs, toMs } = eveningSpan(zoneClock('Europe/Zurich'), date);
      return (toMs - fromMs) / 3_600_000;
    };
    expect(hours('2027-03-27')).toBe(23);
    expect(hours('2027-06-01')).toBe(24);
    expect(hours('2027-10-30')).toBe(25);
  });
});
