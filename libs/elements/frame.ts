import { ARCSEC, cross, equatorialToEcliptic, type Matrix, rotate, toDeg, toRad, type Vector } from '#sky';
import { wrap360 } from './conic';

/** The plane and equinox to which an orbit's three angles are referred. */
export type ElementFrame = 'ecliptic J2000' | 'equator J2000' | 'ecliptic B1950' | 'equator B1950';

/** The angles of an orbit in one frame, degrees. */
export interface OrbitAngles {
  readonly inclinationDeg: number;
  readonly nodeDeg: number;
  readonly argumentOfPerihelionDeg: number;
}

/** Mean obliquity of B1950.0 by Newcomb's formula, 23 deg 26 arcmin 44.84 arcsec (from memory). */
const OBLIQUITY_1950 = 84_404.84 * ARCSEC;

/**
 * From the ecliptic and equinox B1950 (FK4) to J2000 (FK5): the constants of Meeus, Astronomical Algorithms,
 * chapter 24 (from memory; his worked example for 2P/Encke, remembered too, comes out to the last digit).
 */
const NODE_1950 = toRad(5.19856209);
const NODE_2000 = toRad(4.50001688);
const TILT = toRad(0.00651966);

/** The angles referred to the ecliptic and equinox J2000; every other frame is rotated into it. */
export function toEclipticJ2000(angles: OrbitAngles, frame: ElementFrame): OrbitAngles {
  if (frame === 'ecliptic J2000') return angles;
  const { p, q } = axes(angles);
  const turn = TURNS[frame];
  return fromAxes(turn(p), turn(q));
}

const TURNS: Readonly<Record<Exclude<ElementFrame, 'ecliptic J2000'>, (v: Vector) => Vector>> = {
  'equator J2000': equatorialToEcliptic,
  'ecliptic B1950': eclipticOf1950,
  'equator B1950': (v) => eclipticOf1950(tilt(v, -OBLIQUITY_1950)),
};

function eclipticOf1950(v: Vector): Vector {
  return spin(tilt(spin(v, NODE_1950), TILT), -NODE_2000);
}

/** Turned about the third axis, so that longitudes grow by the angle. */
function spin(v: Vector, angle: number): Vector {
  const [c, s] = [Math.cos(angle), Math.sin(angle)];
  const matrix: Matrix = [
    [c, -s, 0],
    [s, c, 0],
    [0, 0, 1],
  ];
  return rotate(matrix, v);
}

/** Turned about the first axis. */
function tilt(v: Vector, angle: number): Vector {
  const [c, s] = [Math.cos(angle), Math.sin(angle)];
  const matrix: Matrix = [
    [1, 0, 0],
    [0, c, -s],
    [0, s, c],
  ];
  return rotate(matrix, v);
}

/** Unit vectors towards perihelion and 90 degrees on. */
function axes(angles: OrbitAngles): { readonly p: Vector; readonly q: Vector } {
  const inclination = toRad(angles.inclinationDeg);
  const node = toRad(angles.nodeDeg);
  const peri = toRad(angles.argumentOfPerihelionDeg);
  const place = (v: Vector): Vector => spin(tilt(spin(v, peri), inclination), node);
  return { p: place([1, 0, 0]), q: place([0, 1, 0]) };
}

/** The inverse of `axes`. An orbit in the plane of the frame has no node; its node is put at 0. */
function fromAxes(p: Vector, q: Vector): OrbitAngles {
  const pole = cross(p, q);
  const sine = Math.hypot(pole[0], pole[1]);
  const inPlane = sine < 1e-12;
  const nodeRad = inPlane ? 0 : Math.atan2(pole[0], -pole[1]);
  const periRad = inPlane ? Math.atan2(p[1] * Math.sign(pole[2]), p[0]) : Math.atan2(p[2], q[2]);
  return {
    inclinationDeg: toDeg(Math.atan2(sine, pole[2])),
    nodeDeg: wrap360(toDeg(nodeRad)),
    argumentOfPerihelionDeg: wrap360(toDeg(periRad)),
  };
}

/** A frame from the words people use for plane and equinox; null where the words say something else. */
export function readFrame(text: string): ElementFrame | null {
  const words = text.toLowerCase();
  const old = /b\s*1950|(^|\D)1950|fk4/.test(words);
  const now = /j\s*2000|(^|\D)2000|fk5|icr[fs]|eme/.test(words);
  const equator = /equat|icr[fs]|eme|fk/.test(words);
  const ecliptic = /eclip/.test(words);
  if ((old && now) || (!old && !now && !equator && !ecliptic) || /of date/.test(words)) return null;
  if (/\d{4}/.test(words) && !old && !now) return null;
  const plane = equator && !ecliptic ? 'equator' : 'ecliptic';
  return `${plane} ${old ? 'B1950' : 'J2000'}`;
}
