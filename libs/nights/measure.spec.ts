import fc from 'fast-check';
import { inventedProgramme, inventedSite, inventedSkyline } from './fixtures';
import { figureEvening } from './judge';
import { createWorkbench } from './measure';
import { DEFAULT_WEIGHTS } from './programme';
import { prepareSeason } from './season';
import { prepareSite } from './siteInstant';

const season = prepareSeason(inventedProgramme(), '2027-01-01', '2027-12-31');

describe('measuring for a search', () => {
  it('gives the same showings and score as measuring closely, by bounds instead of every step', () => {
    const quick = createWorkbench();
    const close = createWorkbench();
    const number = (min: number, max: number) => fc.double({ min, max, noNaN: true });
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: 364 }),
        number(-69, 69),
        number(17, 22),
        number(0, 25),
        (day, latitudeDeg, mu, high) => {
          const date = new Date(Date.UTC(2027, 0, 1 + day)).toISOString().slice(0, 10);
          const site = prepareSite(
            inventedSite({
              latitudeDeg,
              horizon: inventedSkyline(high),
              sky: {
                zenithMagPerArcsec2: mu,
                extinctionMagPerAirmass: 0.2,
                domes: [{ azimuthRad: 1, widthRad: 0.8, brighteningMag: 1 }],
              },
            }),
          );
          const a = figureEvening(quick, season, site, DEFAULT_WEIGHTS, date, false);
          const b = figureEvening(close, season, site, DEFAULT_WEIGHTS, date, true);
          expect(a.score).toBe(b.score);
          if (a.shares === null) return;
          season.programme.items.forEach((_, i) => {
            expect(quick.targets[i]!.edges).toEqual(close.targets[i]!.edges);
            expect(quick.targets[i]!.highestSine).toBe(close.targets[i]!.highestSine);
          });
        },
      ),
      { numRuns: 300 },
    );
  });
});
