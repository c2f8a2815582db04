import { BINOCULAR_10X50, NAKED_EYE, TELESCOPE_200 } from './instrument';
import { limitFromTable, limitTable } from './limitTable';
import { magToLuminance } from './luminance';
import { limitingMagnitude } from './visibility';

describe('a table of limits', () => {
  it.each([NAKED_EYE, BINOCULAR_10X50, TELESCOPE_200])('is within 0.005 mag for $name', (instrument) => {
    for (const [major, minor] of [
      [0, 0],
      [1, 1],
      [10, 4],
      [90, 60],
    ] as const) {
      const table = limitTable(instrument, major, minor);
      let worst = 0;
      for (let mag = 2; mag <= 23; mag += 0.0093) {
        const off =
          limitFromTable(table, magToLuminance(mag)) - limitingMagnitude(instrument, mag, major, minor);
        worst = Math.max(worst, Math.abs(off));
      }
      expect(worst).toBeLessThan(0.005);
    }
  });

  it('takes the observer into account', () => {
    const keen = { pupilMm: 7, fieldFactor: 1.4 };
    const table = limitTable(TELESCOPE_200, 10, 10, keen);
    expect(limitFromTable(table, magToLuminance(20.3))).toBeCloseTo(
      limitingMagnitude(TELESCOPE_200, 20.3, 10, 10, keen),
      2,
    );
  });

  it('keeps its end values beyond its ends', () => {
    const table = limitTable(NAKED_EYE, 0, 0);
    expect(limitFromTable(table, magToLuminance(0))).toBe(limitFromTable(table, magToLuminance(-3)));
    expect(limitFromTable(table, magToLuminance(25))).toBe(limitFromTable(table, magToLuminance(30)));
    expect(limitFromTable(table, 0)).toBe(limitFromTable(table, magToLuminance(30)));
  });
});
