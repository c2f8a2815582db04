import { toRad } from './angles';
import { isNearRisenSun } from './sunSafety';

test.each([
  [14.9, 30, true],
  [14.9, -0.8, true],
  [15.1, 30, false],
  [14.9, -0.9, false],
])('%d degrees from a Sun at %d degrees: too near is %s', (elongationDeg, altitudeDeg, near) => {
  expect(isNearRisenSun(toRad(elongationDeg), toRad(altitudeDeg))).toBe(near);
});
