import { toRad } from './angles';
import { compassPoint } from './compass';

describe('compass points', () => {
  test.each([
    [0, 'N', 'north'],
    [11, 'N', 'north'],
    [12, 'NNE', 'north'],
    [157.5, 'SSE', 'south'],
    [225, 'SW', 'south-west'],
    [359, 'N', 'north'],
    [-90, 'W', 'west'],
    [450, 'E', 'east'],
  ])('names %d degrees %s, and %s of eight', (degrees, letters, eighth) => {
    expect(compassPoint(toRad(degrees), 16).letters).toBe(letters);
    expect(compassPoint(toRad(degrees), 8).word).toBe(eighth);
  });
});
