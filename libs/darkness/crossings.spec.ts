import { type AltitudeOf, altitudeCurve, crossings } from './crossings';

const MINUTE = 60_000;
const HOUR = 60 * MINUTE;

/** A daily swing of one radian, highest at `peakMs`. */
function swing(peakMs: number): AltitudeOf {
  return (t) => Math.cos((2 * Math.PI * (t - peakMs)) / (24 * HOUR));
}

describe('crossings', () => {
  it('finds each crossing of a daily swing, in order, with its direction', () => {
    const found = crossings(swing(0), 0, HOUR, 49 * HOUR);
    expect(found.map(({ rising }) => rising)).toEqual([false, true, false, true]);
    found.forEach(({ utcMs }, i) => {
      expect(Math.abs(utcMs - (6 + 12 * i) * HOUR)).toBeLessThan(5);
    });
  });

  it.each([
    ['in the middle of a step', 7.5 * HOUR],
    ['on a sample', 8 * HOUR],
    ['in the first minute', 1 * MINUTE],
    ['in the first hour', 25 * MINUTE],
    ['in the last hour', 23.6 * HOUR],
  ])('sees a body clear the level for %s only briefly', (_, peakMs) => {
    const altitude = swing(peakMs);
    const halfMs = 40_000;
    const found = crossings(altitude, altitude(peakMs + halfMs), 0, 24 * HOUR);
    expect(found).toHaveLength(2);
    expect(Math.abs(found[0]!.utcMs - (peakMs - halfMs))).toBeLessThan(200);
    expect(Math.abs(found[1]!.utcMs - (peakMs + halfMs))).toBeLessThan(200);
    expect(found.map(({ rising }) => rising)).toEqual([true, false]);
  });

  it('sees a brief dip below a level', () => {
    const altitude = swing(0);
    const found = crossings(altitude, altitude(12 * HOUR + 30_000), 0, 24 * HOUR);
    expect(found.map(({ rising }) => rising)).toEqual([false, true]);
    expect(Math.abs(found[1]!.utcMs - found[0]!.utcMs - 60_000)).toBeLessThan(400);
  });

  it('has none where the level is never reached, or only from the start on', () => {
    expect(crossings(swing(12 * HOUR), 1.01, 0, 24 * HOUR)).toEqual([]);
    expect(crossings((t) => t * 1e-9, 0, 0, HOUR)).toEqual([]);
    expect(crossings((t) => t * 1e-9, 0, HOUR, HOUR)).toEqual([]);
  });

  it('ends on a curve that is not a number', () => {
    expect(crossings(() => NaN, 0, 0, 24 * HOUR)).toEqual([]);
  });

  it('asks for a day of altitudes sparingly', () => {
    let asked = 0;
    const altitude: AltitudeOf = (t) => {
      asked++;
      return swing(9.3 * HOUR)(t);
    };
    altitudeCurve(altitude, 0, 24 * HOUR);
    expect(asked).toBeLessThan(50);
  });
});
