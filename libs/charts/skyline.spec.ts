import { skylineCorners, skylineOf } from './skyline';

const degree = Math.PI / 180;
const heightAt = (points: Parameters<typeof skylineOf>[0], azimuthDeg: number): number =>
  skylineOf(points)(azimuthDeg * degree) / degree;

describe('skylineOf', () => {
  const hills = [
    { azimuthDeg: 350, altitudeDeg: 10 },
    { azimuthDeg: 10, altitudeDeg: 20 },
    { azimuthDeg: 190, altitudeDeg: 2 },
  ];

  it('passes through its points and is straight between them, across north too', () => {
    for (const { azimuthDeg, altitudeDeg } of hills) {
      expect(heightAt(hills, azimuthDeg)).toBeCloseTo(altitudeDeg, 9);
    }
    expect(heightAt(hills, 0)).toBeCloseTo(15, 9);
    expect(heightAt(hills, 360)).toBeCloseTo(15, 9);
    expect(heightAt(hills, 100)).toBeCloseTo(11, 9);
    expect(heightAt(hills, 270)).toBeCloseTo(6, 9);
  });

  it('is the level horizon where nothing was measured, level at one height for one point', () => {
    expect(heightAt([], 123)).toBe(0);
    expect(heightAt([{ azimuthDeg: 40, altitudeDeg: 7 }], 200)).toBeCloseTo(7, 9);
  });

  it('tells where it bends', () => {
    expect(skylineCorners([{ azimuthDeg: -10, altitudeDeg: 1 }])[0]! / degree).toBeCloseTo(350, 9);
  });
});
