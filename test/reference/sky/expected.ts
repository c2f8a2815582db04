import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import {
  ARCSEC,
  type Direction,
  fromSpherical,
  type Observer,
  separation,
  type SkyTarget,
  type SolarBody,
  toRad,
} from '#sky';

/** One of the files of expected values beside this; README.md says how each is made. */
export function expected<Tables>(file: string): Tables {
  return JSON.parse(readFileSync(join(__dirname, file), 'utf8')) as Tables;
}

export type ObserverRow = readonly [latitudeDeg: number, longitudeDeg: number, elevationM: number];

export function observerOf([latitudeDeg, longitudeDeg, elevationM]: ObserverRow): Observer {
  return { latitudeRad: toRad(latitudeDeg), longitudeRad: toRad(longitudeDeg), elevationM };
}

export function solarTarget(body: SolarBody): SkyTarget {
  return { kind: 'solarSystem', name: body, body };
}

/** Angle between a place found and one expected in degrees, arcsec. */
export function missArcsec(found: Direction, raDeg: number, decDeg: number): number {
  const there = fromSpherical(toRad(raDeg), toRad(decDeg));
  return separation(fromSpherical(found.raRad, found.decRad), there) / ARCSEC;
}

/** Misses in altitude and in azimuth (times the cosine of the altitude), arcsec. */
export function horizontalMiss(
  found: { readonly altitudeRad: number; readonly azimuthRad: number },
  altitudeDeg: number,
  azimuthDeg: number,
): { readonly altitude: number; readonly azimuth: number } {
  const turn = Math.sin((found.azimuthRad - toRad(azimuthDeg)) / 2);
  return {
    altitude: Math.abs(found.altitudeRad - toRad(altitudeDeg)) / ARCSEC,
    azimuth: (2 * Math.asin(Math.abs(turn)) * Math.cos(toRad(altitudeDeg))) / ARCSEC,
  };
}
