import {
  ARCSEC,
  fromSpherical,
  type OrbitTarget,
  place,
  separation,
  trackPlace,
  utcMsToTtJd,
  withPerturbations,
} from '#sky';
import { inventedComet, inventedProgramme, programmeItem } from './fixtures';
import { prepareSeason } from './season';

describe('prepareSeason', () => {
  const comet = inventedComet('2027-06-10', { e: 0.6 }) as OrbitTarget;
  const epochTtJd = utcMsToTtJd(Date.parse('2026-02-01T00:00:00Z'));
  const dated = { ...comet, name: 'dated', elements: { ...comet.elements, epochTtJd } };
  const programme = inventedProgramme({ items: [programmeItem(comet), programmeItem(dated)] });
  const { tracks } = prepareSeason(programme, '2027-01-01', '2027-12-31');
  const out = new Float64Array(3);

  it('lets bodies whose elements name an epoch move under the planets, others on their conics', () => {
    const utcMs = Date.parse('2027-11-20T22:00:00Z');
    const missFrom = (track: number, target: OrbitTarget) => {
      trackPlace(tracks[track]!, utcMs, out);
      const { raRad, decRad } = place(target, utcMs, null).apparent;
      return separation([out[0]!, out[1]!, out[2]!], fromSpherical(raRad, decRad)) / ARCSEC;
    };
    expect(missFrom(0, comet)).toBeLessThan(0.1);
    expect(missFrom(1, withPerturbations(dated, utcMs, utcMs))).toBeLessThan(0.1);
    expect(missFrom(1, comet)).toBeGreaterThan(5);
  });
});
