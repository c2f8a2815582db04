import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { type OrbitalElements, type OrbitTarget, separation, toRad, type Vector } from '#sky';

/** Name, epoch (TT JD), q (au), e, inclination, node, argument of perihelion (degrees), perihelion (TT JD). */
export type ElementRow = readonly [string, ...numbers: number[]];

/** One of the files of expected values beside this; README.md says how each is made. */
export function expected<Tables>(file: string): Tables {
  return JSON.parse(readFileSync(join(__dirname, file), 'utf8')) as Tables;
}

export function elementsOf([
  ,
  epoch,
  q,
  e,
  inclination,
  node,
  argument,
  perihelion,
]: ElementRow): OrbitalElements {
  return {
    perihelionDistanceAu: q!,
    eccentricity: e!,
    inclinationRad: toRad(inclination!),
    nodeRad: toRad(node!),
    argumentOfPerihelionRad: toRad(argument!),
    perihelionTtJd: perihelion!,
    epochTtJd: epoch!,
  };
}

export function targetOf(row: ElementRow): OrbitTarget {
  return { kind: 'orbit', name: row[0], elements: elementsOf(row), brightness: null, comaArcmin: 0 };
}

/** Angle between two directions, arcsec. */
export function arcsecBetween(a: Vector, b: Vector): number {
  return (separation(a, b) * 180 * 3600) / Math.PI;
}
