import { AstroTime, DeltaT_EspenakMeeus, SetDeltaTFunction, SiderealTime } from 'astronomy-engine';
import { HOUR } from './angles';

export const MS_PER_DAY = 86_400_000;
/** The epoch J2000.0 as a Julian date of Terrestrial Time. */
export const J2000_TT_JD = 2_451_545;
/** The Unix epoch as a Julian date. */
const UNIX_EPOCH_JD = 2_440_587.5;

/**
 * TAI - UTC from each date on (IERS Bulletin C). No leap second has followed that of 2017.
 */
const LEAP_SECONDS: readonly (readonly [utcMs: number, taiMinusUtc: number])[] = (
  [
    ['1972-01-01', 10],
    ['1972-07-01', 11],
    ['1973-01-01', 12],
    ['1974-01-01', 13],
    ['1975-01-01', 14],
    ['1976-01-01', 15],
    ['1977-01-01', 16],
    ['1978-01-01', 17],
    ['1979-01-01', 18],
    ['1980-01-01', 19],
    ['1981-07-01', 20],
    ['1982-07-01', 21],
    ['1983-07-01', 22],
    ['1985-07-01', 23],
    ['1988-01-01', 24],
    ['1990-01-01', 25],
    ['1991-01-01', 26],
    ['1992-07-01', 27],
    ['1993-07-01', 28],
    ['1994-07-01', 29],
    ['1996-01-01', 30],
    ['1997-07-01', 31],
    ['1999-01-01', 32],
    ['2006-01-01', 33],
    ['2009-01-01', 34],
    ['2012-07-01', 35],
    ['2015-07-01', 36],
    ['2017-01-01', 37],
  ] as const
).map(([day, seconds]) => [Date.parse(`${day}T00:00:00Z`), seconds]);

/**
 * Terrestrial Time minus UTC in seconds at a UTC instant: 69.184 s from 2017 on, the leap seconds back
 * to 1972, and before that the polynomial of Espenak and Meeus for TT - UT.
 */
export function ttMinusUtcSeconds(utcMs: number): number {
  for (let i = LEAP_SECONDS.length - 1; i >= 0; i--) {
    const [from, taiMinusUtc] = LEAP_SECONDS[i]!;
    if (utcMs >= from) return taiMinusUtc + 32.184;
  }
  return DeltaT_EspenakMeeus(utcMsToJd(utcMs) - J2000_TT_JD);
}

// The library's own prediction of Delta T is 6 to 9 s off after 2025, which moves the Moon by 3 to 6
// arcsec. This is the only place that sets it.
SetDeltaTFunction((daysSinceJ2000) => ttMinusUtcSeconds(jdToUtcMs(daysSinceJ2000 + J2000_TT_JD)));

/** UTC epoch milliseconds as a Julian date of UTC. */
export function utcMsToJd(utcMs: number): number {
  return utcMs / MS_PER_DAY + UNIX_EPOCH_JD;
}

/** A Julian date of UTC as epoch milliseconds. */
export function jdToUtcMs(jd: number): number {
  return (jd - UNIX_EPOCH_JD) * MS_PER_DAY;
}

/** UTC epoch milliseconds as a Julian date of Terrestrial Time. */
export function utcMsToTtJd(utcMs: number): number {
  return utcMsToJd(utcMs) + ttMinusUtcSeconds(utcMs) / 86_400;
}

/** A Julian date of Terrestrial Time as UTC epoch milliseconds. */
export function ttJdToUtcMs(ttJd: number): number {
  const tt = jdToUtcMs(ttJd);
  // The first guess can fall on the wrong side of a leap second by one second only; the second cannot.
  const guess = tt - ttMinusUtcSeconds(tt) * 1000;
  return tt - ttMinusUtcSeconds(guess) * 1000;
}

/** The instant in the form that the planetary library takes; UT1 is taken as UTC. */
export function astroTime(utcMs: number): AstroTime {
  return new AstroTime(utcMsToJd(utcMs) - J2000_TT_JD);
}

/** Greenwich apparent sidereal time as an angle in [0, 2π), radians; UT1 is taken as UTC. */
export function siderealAngle(utcMs: number): number {
  return SiderealTime(astroTime(utcMs)) * HOUR;
}
