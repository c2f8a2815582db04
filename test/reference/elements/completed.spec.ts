import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { completeElements, type GivenElements, isoTt } from '#elements';

interface Case {
  readonly whole: Record<NumberKey, number | null>;
  readonly times: { readonly epoch: string; readonly perihelionTime: string | null };
  readonly ways: readonly (readonly NumberKey[])[];
}
type NumberKey =
  | 'perihelionDistanceAu'
  | 'eccentricity'
  | 'semiMajorAxisAu'
  | 'meanMotionDegPerDay'
  | 'periodYears'
  | 'meanAnomalyDeg'
  | 'perihelionTtJd'
  | 'epochTtJd';

// Made by completed.py in 50-digit decimals.
const CASES = JSON.parse(readFileSync(join(__dirname, 'completed.json'), 'utf8')) as Case[];

/** Rounding of the given values to 53 bits, grown by 1/(1 - e) where e is near 1. */
function relativeSlack(e: number): number {
  return 1e-14 + 1e-15 / Math.abs(1 - e);
}

test('every sufficient part of a set gives the whole set', () => {
  expect(CASES).toHaveLength(30);
  let completed = 0;
  for (const { whole, times, ways } of CASES) {
    for (const way of ways) {
      const given: GivenElements = {
        designation: 'C/2031 K7',
        inclinationDeg: 10,
        nodeDeg: 20,
        argumentOfPerihelionDeg: 30,
        ...Object.fromEntries(way.map((key) => [key, whole[key]])),
      };
      const { set, problems } = completeElements(given);
      expect(problems.filter((problem) => problem.severity === 'error')).toEqual([]);
      const slack = relativeSlack(whole.eccentricity!);
      for (const key of [
        'perihelionDistanceAu',
        'semiMajorAxisAu',
        'meanMotionDegPerDay',
        'periodYears',
      ] as const) {
        if (whole[key] === null) expect(set![key]).toBeNull();
        else expect(Math.abs(set![key]! / whole[key] - 1)).toBeLessThan(20 * slack);
      }
      expect(Math.abs(set!.eccentricity - whole.eccentricity!)).toBeLessThan(1e-14);
      // A Julian date holds 5e-10 day; what M / n loses besides grows with the days between T and the epoch.
      const days = Math.abs(whole.epochTtJd! - whole.perihelionTtJd!);
      const dayError = Math.abs(set!.perihelionTtJd - whole.perihelionTtJd!);
      expect(dayError).toBeLessThan(1e-9 + 20 * slack * days);
      const turns = Math.abs(set!.meanAnomalyDeg! - whole.meanAnomalyDeg!) / whole.meanMotionDegPerDay!;
      expect(turns).toBeLessThan(2e-9 + 20 * slack * days);
      completed++;
    }
    expect(isoTt(whole.epochTtJd!)).toBe(times.epoch);
    if (times.perihelionTime !== null) {
      const apart = Date.parse(`${isoTt(whole.perihelionTtJd!)}Z`) - Date.parse(`${times.perihelionTime}Z`);
      expect(Math.abs(apart)).toBeLessThanOrEqual(1);
    }
  }
  expect(completed).toBe(30 * 4 + 20 * 2);
});
