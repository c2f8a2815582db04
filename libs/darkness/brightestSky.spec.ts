import fc from 'fast-check';
import { brightestSky, COS_MOON_CLEARANCE, darkestSky } from './brightestSky';
import { createSkyLight, setSkyLight, skyLuminance } from './brightness';
import { brightestSkyShowing, darkestSkyHiding, limitFromTable, limitTable } from './limitTable';
import { BINOCULAR_10X50, NAKED_EYE, TELESCOPE_200 } from './instrument';

const number = (min: number, max: number) => fc.double({ min, max, noNaN: true });

describe('brightestSky and darkestSky', () => {
  it('bound the sky, the upper one away from the Moon, by night and in twilight', () => {
    fc.assert(
      fc.property(
        fc.record({
          mu: number(17, 22),
          k: number(0.05, 1),
          dome: number(0, 3),
          azimuth: number(0, 6),
          sunAltitude: number(-0.5, 0.05),
          sunAzimuth: number(0, 6.28),
        }),
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
          setSkyLight(light, site, sky.sunAltitude, sky.sunAzimuth, moon.altitude, moon.phase, moon.distance);
          // Over the Sun, where twilight is brightest, and anywhere.
          for (const [height, direction] of [
            [sine, azimuth],
            [0, sky.sunAzimuth],
            [1, 0],
          ] as const) {
            const luminance = skyLuminance(light, height, direction, cosMoon);
            expect(luminance).toBeLessThanOrEqual(brightestSky(light) * (1 + 1e-9));
            expect(luminance).toBeGreaterThanOrEqual(darkestSky(light) * (1 - 1e-9));
          }
        },
      ),
      { numRuns: 3000 },
    );
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

describe('darkestSkyHiding', () => {
  const tables = [NAKED_EYE, TELESCOPE_200].flatMap((instrument) =>
    [0, 30].map((size) => limitTable(instrument, size, size)),
  );

  it('is a sky against which, as against every brighter one, the magnitude does not show', () => {
    fc.assert(
      fc.property(fc.constantFrom(...tables), number(-4, 14), number(1, 1e4), (table, magnitude, times) => {
        const darkest = darkestSkyHiding(table, magnitude);
        if (darkest === Infinity) expect(limitFromTable(table, 1e12)).toBeGreaterThanOrEqual(magnitude);
        else expect(limitFromTable(table, darkest * times)).toBeLessThan(magnitude);
      }),
      { numRuns: 3000 },
    );
  });
});
