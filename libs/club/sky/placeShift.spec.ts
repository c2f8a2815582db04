import { type ChartScale } from '#charts';
import { type FixedTarget, toRad } from '#sky';
import { namedTarget } from './namedTarget';
import { placeShift, shiftWords } from './placeShift';
import { chartScene } from '../charts';

const UTC = Date.parse('2027-03-01T20:00:00Z');

/** A fixed place, so that the shift is known without working anything out. */
function at(raDeg: number, decDeg: number): FixedTarget {
  const size = { majorArcmin: 0, minorArcmin: 0 };
  return { kind: 'fixed', name: 'x', raRad: toRad(raDeg), decRad: toRad(decDeg), magnitude: 8, ...size };
}

test.each([
  [at(80, 20), at(80, 20.5), 30, 0, 'north'],
  [at(80, 20), at(80, 19), 60, 180, 'south'],
  // East is the way of greater right ascension; at the equator a degree of it is a degree.
  [at(80, 0), at(81, 0), 60, 90, 'east'],
  [at(80, 0), at(79.99, 0.01), 0.6 * Math.SQRT2, 315, 'north-west'],
] as const)('measures a shift in arcmin with its direction', (from, to, arcmin, angleDeg, direction) => {
  const shift = placeShift(from, to, UTC, null);
  expect(shift.shiftArcmin).toBeCloseTo(arcmin, 5);
  expect(shift.shiftArcsec).toBeCloseTo(arcmin * 60, 3);
  expect(Math.abs(shift.positionAngleDeg - angleDeg)).toBeLessThan(0.001);
  expect(shift.direction).toBe(direction);
});

it('calls a shift harmless below half a millimetre on the largest sheet, scale by scale', () => {
  // Half a millimetre of 191.9 mm: 60 degrees give 9.2', less what the projection draws together in the middle;
  // 8 degrees 1.25'; 1.5 degrees 0.235'.
  const seenFrom = (arcmin: number): readonly ChartScale[] =>
    placeShift(at(80, 0), at(80, arcmin / 60), UTC, null).scales.flatMap(({ scale, harmless }) =>
      harmless ? [] : [scale],
    );
  expect(seenFrom(0.23)).toEqual([]);
  expect(seenFrom(0.24)).toEqual(['eyepiece']);
  expect(seenFrom(1.24)).toEqual(['eyepiece']);
  expect(seenFrom(1.26)).toEqual(['binocular', 'eyepiece']);
  expect(seenFrom(9.1)).toEqual(['binocular', 'eyepiece']);
  expect(seenFrom(9.7)).toEqual(['eye', 'binocular', 'eyepiece']);
});

test.each(['a4', 'letter'] as const)('never says fewer millimetres than a real %s sheet has', (paper) => {
  for (const scale of ['eye', 'binocular', 'eyepiece'] as const) {
    const target = namedTarget('M 42');
    const scene = chartScene({
      target,
      observer: { latitudeRad: toRad(42), longitudeRad: toRad(-7), elevationM: 500 },
      zone: 'Europe/Madrid',
      siteName: 'Invented Heath',
      utcMs: UTC,
      scale,
      fieldDeg: null,
      orientation: 'upright',
      paper,
      occasion: null,
      computedUtcMs: UTC,
      programVersion: 'test',
    });
    const onePlace = placeShift(at(80, 0), at(80, 0.1), UTC, null).scales.find((one) => one.scale === scale)!;
    const onSheetMm = scene.plate.mmPerRadian * toRad(0.1);
    expect(onePlace.shiftMm).toBeGreaterThanOrEqual(onSheetMm * 0.9999);
    expect(onePlace.shiftMm).toBeLessThan(onSheetMm * 1.1);
  }
});

test.each([
  [3.21, '3.2 arcsec'],
  [42, '42 arcsec'],
  [75, '1.3 arcmin'],
  [840, '14 arcmin'],
  [10_800, '3.0 degrees'],
])('tells %d arcsec as %s', (shiftArcsec, words) => {
  expect(shiftWords({ shiftArcsec })).toBe(words);
});
