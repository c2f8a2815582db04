import { readElements } from '#elements';
import { ARCSEC, fromSpherical, MS_PER_DAY, place, separation, withPerturbations } from '#sky';
import { orbitTarget } from '../sky/namedTarget';
import { type BodyTrust, bodyTrust } from './bodyTrust';
import { observedArc } from './observedArc';

// Invented lines in the published formats.
const NEW_COMET =
  '    CK31K070  2032 02 11.4837  0.764213  1.000248  143.2097   61.8840   96.3152  20320217   7.5  4.0  C/2031 K7 (Ashgrove)                                     MPC 99991';
const OLD_COMET =
  '0999P         2031 09 03.2065  1.482907  0.617345  201.7730    8.0461   11.9026  20310823  11.0  6.0  999P/Wren-Okafor                                         MPC 99992';
const NUMBERED =
  '~1E3F   15.42  0.15 K31AB 211.30457   96.41208  318.77530    7.26419  0.1438207  0.23221081   2.6214873  0 MPO999993   412   9 2009-2030 0.48 M-v 3Ek Invented   0000 (912345)                    20301104';
const JUST_FOUND =
  'K31K12Q 19.07  0.15 K31AB  34.90216  271.05533  122.68014    4.81377  0.5120884  0.31967626   2.1183406  6 E2031-L07    61   1   38 days 0.37 M-v 3Ek Invented   0804          2031 KQ12          20310628';

const EVENING = Date.parse('2032-03-01T20:00:00Z');

function trust(line: string, utcMs = EVENING): BodyTrust {
  const [set] = readElements(line).sets;
  const { kind, designation, source, observed, epochTtJd } = set!;
  const target = orbitTarget(set!);
  return bodyTrust({ target, kind, designation, source, observed, epochTtJd }, utcMs);
}

it('tells the age of the elements and what the planets have done since the epoch', () => {
  // The epoch, 2032 February 17.0 TT, lies 13 days, 20 h and 69.184 s before the evening's instant in TT.
  const now = trust(NEW_COMET);
  expect(now.ageDays).toBeCloseTo(13 + 20 / 24 + 69.184 / 86_400, 6);

  const [set] = readElements(NUMBERED).sets;
  const conic = orbitTarget(set!);
  const moving = withPerturbations(conic, EVENING, EVENING + MS_PER_DAY);
  const at = (body: typeof conic) => {
    const { raRad, decRad } = place(body, EVENING, null).astrometric;
    return fromSpherical(raRad, decRad);
  };
  const moved = separation(at(conic), at(moving)) / ARCSEC;
  expect(moved).toBeGreaterThan(0.1);
  expect(trust(NUMBERED).movedByPlanetsArcsec).toBeCloseTo(moved, 3);
});

it('gives the error as shares of the finder and eyepiece fields', () => {
  const { expectedError, finder, eyepiece } = trust(JUST_FOUND);
  expect(finder!.fieldDeg).toBe(6);
  expect(finder!.likely).toBeCloseTo(expectedError!.likelyArcsec / 21_600, 12);
  expect(finder!.bad).toBeCloseTo(expectedError!.badArcsec / 21_600, 12);
  expect(eyepiece!.fieldDeg).toBe(0.75);
  expect(eyepiece!.bad).toBeCloseTo(8 * finder!.bad, 12);
});

it('takes a numbered asteroid to be well known and one just found to drift', () => {
  const known = trust(NUMBERED);
  const found = trust(JUST_FOUND);
  expect(known.observedArcDays).toBeCloseTo(21 * 365.25, 9);
  expect(found.observedArcDays).toBe(38);
  expect(known.expectedError!.badArcsec).toBeLessThan(15);
  expect(found.expectedError!.badArcsec).toBeGreaterThan(100 * known.expectedError!.badArcsec);
  expect(found.refresh).toBe(true);
  expect(known.refresh).toBe(false);
});

it('says of comets that outgassing is left out and that elements are to be refreshed', () => {
  for (const line of [NEW_COMET, OLD_COMET]) {
    expect(trust(line).words).toMatch(
      /outgassing, which is not modelled.*to be refreshed.*\(common practice\)/,
    );
  }
  expect(trust(NUMBERED).words).not.toMatch(/outgassing/);
  expect(trust(OLD_COMET).refresh).toBe(true);
  expect(trust(NEW_COMET).line).toMatch(
    /^C\/2031 K7 \(Ashgrove\): elements 14 days old; its place may be off by /,
  );
});

it('cannot tell where a set names no epoch', () => {
  const noEpoch = NEW_COMET.replace('20320217', '        ');
  expect(trust(noEpoch)).toMatchObject({ ageDays: null, expectedError: null, refresh: true });
});

test.each([
  [{ source: 'Circular 1, from 9 days of observations' }, 9, 'source'],
  [{ source: 'MPO999993, from observations of 2009 to 2030' }, 21 * 365.25, 'source'],
  [{ source: 'A 38-day arc' }, 38, 'source'],
  // Found in the second half of May 2031 (K), 16 May; the epoch, 1 February 2032, is 261 days later.
  [{ source: '', designation: 'C/2031 K7', epochTtJd: 2463263.5 }, 261, 'designation'],
  [{ source: 'seen for three nights', designation: '999P' }, null, null],
  [{ source: '', designation: 'Something new' }, null, null],
])('finds the observed arc of %j', (change, days, from) => {
  const arc = observedArc({ designation: '', observed: null, epochTtJd: 2463263.5, ...change });
  expect(arc?.days ?? null).toBe(days);
  expect(arc?.from ?? null).toBe(from);
});
