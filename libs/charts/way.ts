import { type Star, type StarCatalogue, starsInCone } from '#catalogue';
import {
  type Landmark,
  landmarkOf,
  separationOf,
  type StarField,
  starField,
  surroundingsRad,
  visitNear,
} from './landmarks';
import type { SkyPoint } from './projection';

const degree = Math.PI / 180;

/** One step of the way: from a landmark to the next, or to the target, which has none. */
export interface Hop {
  readonly from: Landmark;
  readonly to: Landmark | null;
  readonly lengthRad: number;
}

/** How to come to a target: by hops, by pointing straight at it, or by no good way. */
export type Way =
  | { readonly kind: 'hops'; readonly hops: readonly Hop[] }
  | { readonly kind: 'plain' }
  | { readonly kind: 'none' };

export interface WayWish {
  readonly target: SkyPoint & { readonly magnitude: number | null };
  readonly finderFieldRad: number;
  /** True for places that the ground or the skyline hides, or that stand too low to point at. */
  readonly isHidden: (place: SkyPoint) => boolean;
}

/** What is this bright needs no directions: one sees it and points. Our choice. */
const plainMagnitude = 2.5;
/** Beginnings are looked for this far from the target: first near, where nearly all are found. */
const reachesRad = [14 * degree, 30 * degree];
/** The faintest star that a hop may land on: what any finder shows on a hazy night (common practice). */
const faintestLanding = 7;
/** Rivals are counted a little fainter than that. */
const faintestSeen = 7.7;
/** More rivals than these and no one knows which star is meant. */
const mostRivals = 2;
/** A star that people see and point at. */
const faintestStart = 3.5;
/** A way that costs more than this is no good way. */
const dearest = 11;
const mostHops = 6;

/**
 * The easiest way from a star that people see with the unaided eye to the target, in hops no longer than the
 * finder's field, each landing on a star or close pair that stands out. A shortest path (Dijkstra 1959), searched
 * from the target outwards; a hop costs for itself, for its length, and for a faint or crowded landing.
 */
export function wayTo(stars: StarCatalogue, wish: WayWish): Way {
  const { target } = wish;
  if (target.magnitude !== null && target.magnitude <= plainMagnitude) return { kind: 'plain' };
  for (const reachRad of reachesRad) {
    const field = starField(
      starsInCone(stars, {
        raRad: target.raRad,
        decRad: target.decRad,
        // So much wider that no star within reach lacks its rivals.
        radiusRad: reachRad + surroundingsRad,
        faintestMagnitude: faintestSeen,
      }),
    );
    const found = search(field, wish, reachRad);
    // Nothing that goes farther out could be cheaper than this.
    const isBest = found !== null && found.cost <= leastCostBeyond(reachRad, wish.finderFieldRad);
    if (found !== null && (isBest || reachRad === reachesRad.at(-1))) {
      return { kind: 'hops', hops: hopsOf(found.start) };
    }
  }
  return { kind: 'none' };
}

function hopsOf(start: Node): Hop[] {
  const hops: Hop[] = [];
  for (let node: Node | null = start; node !== null; node = node.next) {
    hops.push({ from: node.landmark, to: node.next?.landmark ?? null, lengthRad: node.lengthRad });
  }
  return hops;
}

/** The least that a way which anywhere is farther than `reachRad` from the target can cost. */
function leastCostBeyond(reachRad: number, fieldRad: number): number {
  const hops = Math.ceil(reachRad / fieldRad);
  return hops * hopCost(reachRad / hops, fieldRad, false);
}

interface Node {
  readonly index: number;
  readonly landmark: Landmark;
  /** From here to the target, without the landing here. */
  cost: number;
  hops: number;
  next: Node | null;
  lengthRad: number;
  settled: boolean;
}

interface Found {
  readonly start: Node;
  readonly cost: number;
}

function search(field: StarField, wish: WayWish, reachRad: number): Found | null {
  const nodes = new Map<number, Node | null>();
  const frontier: Node[] = [];
  let best: Found | null = null;

  const reach = (from: SkyPoint, next: Node | null, costThere: number, hops: number): void => {
    if (hops > mostHops) return;
    visitNear(field, from, wish.finderFieldRad, (index, lengthRad) => {
      // A star in the target itself shows no way to it.
      if (lengthRad < leastHopRad) return;
      const cost = costThere + hopCost(lengthRad, wish.finderFieldRad, next === null);
      let node = nodes.get(index);
      if (node === undefined) {
        node = nodeAt(field, index, wish, reachRad);
        nodes.set(index, node);
        if (node !== null) frontier.push(node);
      }
      if (node === null || node.settled || cost >= node.cost) return;
      node.cost = cost;
      node.hops = hops;
      node.next = next;
      node.lengthRad = lengthRad;
    });
  };

  reach(wish.target, null, 0, 1);
  for (;;) {
    const node = takeCheapest(frontier);
    if (node === null || node.cost >= Math.min(best?.cost ?? Infinity, dearest)) break;
    node.settled = true;
    const total = node.cost + startCost(node.landmark.star);
    if (total < Math.min(best?.cost ?? Infinity, dearest)) best = { start: node, cost: total };
    reach(node.landmark.star, node, node.cost + landingCost(node.landmark), node.hops + 1);
  }
  return best;
}

const leastHopRad = 0.25 * degree;

function nodeAt(field: StarField, index: number, wish: WayWish, reachRad: number): Node | null {
  const star = field.stars[index]!;
  if (star.magnitude > faintestLanding || wish.isHidden(star)) return null;
  if (separationOf(star, wish.target) > reachRad) return null;
  const landmark = landmarkOf(field, index);
  if (landmark.rivals > mostRivals) return null;
  return { index, landmark, cost: Infinity, hops: 0, next: null, lengthRad: 0, settled: false };
}

function takeCheapest(frontier: Node[]): Node | null {
  let at = -1;
  for (let i = 0; i < frontier.length; i++) {
    const node = frontier[i]!;
    if (at < 0 || node.cost < frontier[at]!.cost) at = i;
  }
  if (at < 0) return null;
  const [node] = frontier.splice(at, 1);
  return node!;
}

/** The share of the finder's field up to which the last hop keeps its beginning on the binocular sheet. */
const shortLast = 0.6;

function hopCost(lengthRad: number, fieldRad: number, isLast: boolean): number {
  const share = lengthRad / fieldRad;
  return 0.8 + 0.5 * share * share + (isLast && share > shortLast ? 1.2 : 0);
}

function landingCost({ star, partner, rivals }: Landmark): number {
  const faint = Math.max(0, star.magnitude - 4) * 0.4;
  // A close pair catches the eye by its shape.
  return faint + 0.6 * rivals - (partner === null ? 0 : Math.min(faint, 0.3));
}

function startCost(star: Star): number {
  if (star.magnitude > faintestStart || star.label === null) return Infinity;
  return Math.max(0, star.magnitude - 0.5) * 0.6 + (star.label.name === null ? 0.8 : 0);
}
