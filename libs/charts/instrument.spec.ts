import { coordinateWords, fieldWords } from './instrument';

const degree = Math.PI / 180;

describe('coordinateWords', () => {
  it('rounds without ever writing 60 minutes or 24 hours', () => {
    expect(coordinateWords(83.633 * degree, 22.0145 * degree)).toBe('RA 5h 34.5m, Dec +22° 01′');
    expect(coordinateWords(359.9999 * degree, -0.0001 * degree)).toBe('RA 0h 00.0m, Dec +0° 00′');
    expect(coordinateWords(14.9999 * degree, -26.9999 * degree)).toBe('RA 1h 00.0m, Dec −27° 00′');
    expect(coordinateWords(-15 * degree, 89.9999 * degree)).toBe('RA 23h 00.0m, Dec +90° 00′');
  });
});

describe('fieldWords', () => {
  it('speaks of degrees, and of minutes under one', () => {
    expect([60, 8, 1.5, 1, 0.5, 0.75].map(fieldWords)).toEqual(['60°', '8°', '1.5°', '1°', '30′', '45′']);
  });
});
