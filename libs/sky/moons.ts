import { JupiterMoons } from 'astronomy-engine';
import { KM_PER_AU } from './observer';
import { heliocentricPlace, LIGHT_DAYS_PER_AU, poleOf, RADIUS_KM } from './solarSystem';
import { astroTime, MS_PER_DAY } from './time';
import { cross, dot, norm, rejected, unit, type Vector } from './vector';

export type MoonName = 'Io' | 'Europa' | 'Ganymede' | 'Callisto';

/** Where one of Jupiter's four great moons stands beside the planet. */
export interface JupiterMoon {
  readonly name: MoonName;
  /** From the planet's middle, radians, in the J2000 frame of charts. */
  readonly eastRad: number;
  readonly northRad: number;
  /** In the planet's equatorial radii: west along its equator, north along its axis (Meeus 1998, chapter 44). */
  readonly westRadii: number;
  readonly northRadii: number;
  /** Seen clear of the disc, behind it, before it, or unseen in the planet's shadow. */
  readonly state: 'clear' | 'behind' | 'inFront' | 'inShadow';
}

const FLATTENING = 0.06487;
const JUPITER_RADIUS_AU = RADIUS_KM.Jupiter / KM_PER_AU;

/**
 * Jupiter's four great moons at a UTC instant; `seen` leads from the observer to the planet, J2000, au. The
 * moons' own motion is that of astronomy-engine (after Lieske's E5), taken when the light left.
 */
export function jupiterMoons(utcMs: number, seen: Vector): JupiterMoon[] {
  const distance = norm(seen);
  const leftMs = utcMs - distance * LIGHT_DAYS_PER_AU * MS_PER_DAY;
  const { io, europa, ganymede, callisto } = JupiterMoons(astroTime(leftMs));
  const ahead = unit(seen);
  const { east, north } = skyAxes(ahead);
  const pole = poleOf('Jupiter', leftMs);
  const axis = unit(rejected(pole, ahead));
  const west = cross(ahead, axis);
  const fromSun = unit(heliocentricPlace('Jupiter', leftMs));
  return (
    [
      ['Io', io],
      ['Europa', europa],
      ['Ganymede', ganymede],
      ['Callisto', callisto],
    ] as const
  ).map(([name, { x, y, z }]) => {
    const from: Vector = [x, y, z];
    const away = distance + dot(from, ahead);
    return {
      name,
      eastRad: dot(from, east) / away,
      northRad: dot(from, north) / away,
      westRadii: dot(from, west) / JUPITER_RADIUS_AU,
      northRadii: dot(from, axis) / JUPITER_RADIUS_AU,
      state: stateOf(from, ahead, fromSun, pole),
    };
  });
}

function stateOf(from: Vector, ahead: Vector, fromSun: Vector, pole: Vector): JupiterMoon['state'] {
  if (isOnDisc(from, ahead, pole)) return dot(from, ahead) > 0 ? 'behind' : 'inFront';
  return dot(from, fromSun) > 0 && isOnDisc(from, fromSun, pole) ? 'inShadow' : 'clear';
}

/** True where a place beside the planet lies on its flattened disc as seen along a direction. */
function isOnDisc(from: Vector, along: Vector, pole: Vector): boolean {
  const axis = unit(rejected(pole, along));
  const up = dot(from, axis) / (1 - FLATTENING);
  const across = dot(from, cross(along, axis));
  return Math.hypot(up, across) < JUPITER_RADIUS_AU;
}

/** East and north on the sky at a direction, unit vectors of the same frame; at a pole, along 6h and 12h. */
export function skyAxes(direction: Vector): { readonly east: Vector; readonly north: Vector } {
  const aside = cross([0, 0, 1], direction);
  const east: Vector = norm(aside) < 1e-12 ? [0, 1, 0] : unit(aside);
  return { east, north: cross(direction, east) };
}
