import fc from 'fast-check';
import { brightestSky, COS_MOON_CLEARANCE } from './brightestSky';
import { createSkyLight, setSkyLight, skyLuminance } from './brightness';
import { brightestSkyShowing, limitFromTable, limitTable } from './limitTable';
import { BINOCULAR_10X50, NAKED_EYE, TELESCOPE_200 } from './instrument';

const number = (min: number, max: number) => fc.double({ min, max, noNaN: true });

describe('brightestSky', () => {
  it('is exceeded nowhere away from the Moon on a night without twilight', () => {
    fc.assert(
      fc.property(
        fc.record({ mu: number(17, 22), k: number(0.05, 1), dome: number(0, 3), azimuth: number(0, 6) }),
        fc.record({ altitude: number(-1.5, 1.5), phase: number(0, 3.1), distance: number(0.0023, 0.0028) }),
        number(0, 1),
        number(0, 6.28),
        number(-1, COS_MOON_CLEARANCE),
        (sky, moon, sine, azimuth, cosMoon) => {
          const light = createSkyLight();
          const site = {
            zenithMagPerArcsec2: sky.mu,
            extinctionMagPerAirmass: sky.k,
            domes: [{ azimuthRad: sky.azimuth, widthRad: 0.7, brighteningMag: sky.dome }],
          };
          setSkyLight(light, site, -0.4, 1, moon.altitude, moon.phase, moon.distance);
          const bound = brightestSky(light) * (1 + 1e-12);
          expect(skyLuminance(light, sine, azimuth, cosMoon)).toBeLessThanOrEqual(bound);
        },
      ),
      { numRuns: 2000 },
    );
  });

  it('gives no bound in twilight', () => {
    const light = createSkyLight();
    const site = { zenithMagPerArcsec2: 21, extinctionMagPerAirmass: 0.2, domes: [] };
    setSkyLight(light, site, -0.2, 1, -0.5, 1, 0.0026);
    expect(brightestSky(light)).toBe(Infinity);
  });
});

describe('brightestSkyShowing', () => {
  const tables = [NAKED_EYE, BINOCULAR_10X50, TELESCOPE_200].flatMap((instrument) =>
    [0, 5, 60].map((size) => limitTable(instrument, size, size)),
  );

  it('is a sky against which, as against every darker one, the magnitude shows', () => {
    fc.assert(
      fc.property(fc.constantFrom(...tables), number(-4, 14), number(0, 1), (table, magnitude, share) => {
        const brightest = brightestSkyShowing(table, magnitude);
        if (brightest === 0) expect(limitFromTable(table, 0)).toBeLessThan(magnitude);
        else expect(limitFromTable(table, brightest * share)).toBeGreaterThanOrEqual(magnitude);
      }),
      { numRuns: 3000 },
    );
  });

  it('is nothing for what shows against no sky', () => {
    expect(brightestSkyShowing(tables[0]!, 12)).toBe(0);
  });
});
