import { eveningContent } from './fixtures/eveningContent';
import { skyMapFigure, skyProjector } from './skyMap';
import { skylineAltitude } from './skyline';

const RADIUS = 90;
const at = skyProjector([100, 120], RADIUS);

// Snyder (1987), Map Projections, USGS Professional Paper 1395, equations 21-2 to 21-4 for the polar case
// worked by hand: rho = R tan(z / 2), with the horizon (z = 90 degrees) on the rim.
it.each([
  [90, 0, 100, 120],
  [0, 0, 100, 30],
  [0, 90, 10, 120],
  [30, 180, 100, 120 + 90 * 0.577_350_27],
  [60, 270, 100 + 90 * 0.267_949_19, 120],
])('puts height %d, azimuth %d at (%d, %d)', (altitudeDeg, azimuthDeg, x, y) => {
  const [xMm, yMm] = at({ altitudeDeg, azimuthDeg });
  expect(xMm).toBeCloseTo(x, 5);
  expect(yMm).toBeCloseTo(y, 5);
});

it('draws only what stands clear of the skyline', () => {
  const content = eveningContent();
  const ink = skyMapFigure(content, [100, 120], RADIUS);
  const dots = ink.filter((one) => one.shape === 'disc' && one.fillGray === 0);
  const clear = content.sky.stars.filter(
    ({ altitudeDeg, azimuthDeg }) => altitudeDeg > skylineAltitude(content.site.horizon, azimuthDeg),
  );
  expect(clear.length).toBeLessThan(content.sky.stars.length);
  expect(dots).toHaveLength(clear.length + content.sky.bodies.length);
  const numbers = ink.flatMap((one) => (one.shape === 'text' && /^\d+$/.test(one.text) ? [one.text] : []));
  expect(new Set(numbers).size).toBe(
    content.targets.filter(
      ({ atMiddle }) => atMiddle.altitudeDeg > skylineAltitude(content.site.horizon, atMiddle.azimuthDeg),
    ).length,
  );
});

it('reads a skyline between its points, across north too', () => {
  const { horizon } = eveningContent().site;
  expect(skylineAltitude(horizon, 45)).toBeCloseTo(8);
  expect(skylineAltitude(horizon, 270)).toBeCloseTo(5.75);
  expect(skylineAltitude(horizon, -90)).toBeCloseTo(5.75);
  expect(skylineAltitude([{ azimuthDeg: 200, altitudeDeg: 9 }], 20)).toBe(9);
  expect(skylineAltitude([], 20)).toBe(0);
});
