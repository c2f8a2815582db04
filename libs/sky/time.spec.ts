import fc from 'fast-check';
import { HOUR } from './angles';
import {
  J2000_TT_JD,
  jdToUtcMs,
  siderealAngle,
  ttJdToUtcMs,
  ttMinusUtcSeconds,
  utcMsToJd,
  utcMsToTtJd,
} from './time';

/** Epoch milliseconds from 1973 to 2100. */
const instant = fc.integer({
  min: Date.parse('1973-01-02T00:00:00Z'),
  max: Date.parse('2100-01-01T00:00:00Z'),
});
/** A Julian date of our days in double precision goes by steps of 2^-31 day, 0.04 ms. */
const JD_STEP_MS = 0.05;

describe('Julian dates', () => {
  // Meeus, Astronomical Algorithms (2nd ed.), chapter 7, the table of dates.
  test.each([
    ['2000-01-01T12:00:00Z', 2451545],
    ['1999-01-01T00:00:00Z', 2451179.5],
    ['1987-01-27T00:00:00Z', 2446822.5],
    ['1987-06-19T12:00:00Z', 2446966],
    ['1988-06-19T12:00:00Z', 2447332],
    ['1900-01-01T00:00:00Z', 2415020.5],
    ['1600-12-31T00:00:00Z', 2305812.5],
  ])('%s is JD %d', (utc, jd) => {
    expect(utcMsToJd(Date.parse(utc))).toBe(jd);
    expect(jdToUtcMs(jd)).toBe(Date.parse(utc));
  });

  it('turn back into the same instant', () => {
    fc.assert(
      fc.property(instant, (utcMs) => {
        expect(Math.abs(jdToUtcMs(utcMsToJd(utcMs)) - utcMs)).toBeLessThan(JD_STEP_MS);
        expect(Math.abs(ttJdToUtcMs(utcMsToTtJd(utcMs)) - utcMs)).toBeLessThan(2 * JD_STEP_MS);
      }),
    );
  });

  it('of TT turn back on both sides of every leap second', () => {
    for (const utc of ['1981-07-01', '1990-01-01', '1999-01-01', '2006-01-01', '2012-07-01', '2017-01-01']) {
      for (const seconds of [-40, -1.5, -0.5, 0.5, 5, 40]) {
        const utcMs = Date.parse(`${utc}T00:00:00Z`) + seconds * 1000;
        const miss = Math.abs(ttJdToUtcMs(utcMsToTtJd(utcMs)) - utcMs);
        expect([utc, seconds, miss < 2 * JD_STEP_MS]).toEqual([utc, seconds, true]);
      }
    }
  });
});

describe('ttMinusUtcSeconds', () => {
  // IERS Bulletin C: TAI - UTC = 37 s from 2017 January 1; TT - TAI = 32.184 s.
  test.each([
    ['2016-12-31T23:59:59Z', 68.184],
    ['2017-01-01T00:00:00Z', 69.184],
    ['2026-12-01T00:00:00Z', 69.184],
    ['2031-06-01T00:00:00Z', 69.184],
  ])('at %s is %d', (utc, seconds) => {
    expect(ttMinusUtcSeconds(Date.parse(utc))).toBeCloseTo(seconds, 9);
  });

  it('joins the older polynomial without a jump of a second', () => {
    const start = Date.parse('1972-01-01T00:00:00Z');
    expect(Math.abs(ttMinusUtcSeconds(start) - ttMinusUtcSeconds(start - 1))).toBeLessThan(1);
  });
});

describe('utcMsToTtJd', () => {
  it('is 64.184 s past J2000.0 at its noon in UTC', () => {
    const days = utcMsToTtJd(Date.parse('2000-01-01T12:00:00Z')) - J2000_TT_JD;
    expect(days * 86_400).toBeCloseTo(64.184, 4);
  });
});

describe('siderealAngle', () => {
  it("agrees with Meeus's example 12.a", () => {
    // Meeus (2nd ed.) example 12.a, 1987 Apr 10, 0h UT: apparent 13h 10m 46.1351s; IAU 1980 nutation.
    const found = siderealAngle(Date.parse('1987-04-10T00:00:00Z')) / HOUR;
    expect(Math.abs(found - (13 + 10 / 60 + 46.1351 / 3600)) * 3600).toBeLessThan(0.02);
  });

  it("agrees with Meeus's example 12.b", () => {
    // Example 12.b, 1987 Apr 10, 19h 21m UT: mean 8h 34m 57.0896s; example 13.b: apparent 8h 34m 56.853s.
    const found = siderealAngle(Date.parse('1987-04-10T19:21:00Z')) / HOUR;
    expect(Math.abs(found - (8 + 34 / 60 + 56.853 / 3600)) * 3600).toBeLessThan(0.02);
  });

  it('comes round in a mean sidereal day', () => {
    // 86164.0905 s (IERS); the equation of the equinoxes moves by less than 0.1 s in ten days.
    fc.assert(
      fc.property(instant, (utcMs) => {
        const tenTurns = siderealAngle(utcMs + 861_640.905 * 1000) - siderealAngle(utcMs);
        expect(Math.abs(Math.sin(tenTurns / 2))).toBeLessThan(1e-5);
      }),
    );
  });
});
