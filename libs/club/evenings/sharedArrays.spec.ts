import { withSharedArrays } from './sharedArrays';

describe('withSharedArrays', () => {
  it('keeps every value and what stands in it twice, and shares the numbers', () => {
    const numbers = Float64Array.of(1, 2.5, -3);
    const track = { name: 'a', place: { coefficients: numbers, degree: 2 } };
    const shared = withSharedArrays({ moon: track, tracks: [track, null], none: undefined });
    expect(shared).toEqual({ moon: track, tracks: [track, null], none: undefined });
    expect(shared.tracks[0]).toBe(shared.moon);
    expect(Object.prototype.toString.call(shared.moon.place.coefficients.buffer)).toBe(
      '[object SharedArrayBuffer]',
    );
  });
});
