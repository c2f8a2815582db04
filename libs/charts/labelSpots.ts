import type { Disc, Spot, TextSize } from './labels';
import type { SheetPoint } from './scene';

/** Between a label and its own dot. */
const ownGapMm = 0.5;

/** The eight spots beside a disc, right first, then left, above and below, then the corners. */
export function spotsBeside({ xMm, yMm, radiusMm }: Disc): (size: TextSize) => Spot[] {
  const gap = radiusMm + ownGapMm;
  const corner = gap * Math.SQRT1_2;
  return ({ width, above, below }) => {
    const middle = yMm + (above - below) / 2;
    return [
      { xMm: xMm + gap, yMm: middle, cost: 0 },
      { xMm: xMm - gap - width, yMm: middle, cost: 0.5 },
      { xMm: xMm + corner, yMm: yMm - corner - below, cost: 0.7 },
      { xMm: xMm + corner, yMm: yMm + corner + above, cost: 0.8 },
      { xMm: xMm - width / 2, yMm: yMm - gap - below, cost: 0.9 },
      { xMm: xMm - width / 2, yMm: yMm + gap + above, cost: 1 },
      { xMm: xMm - corner - width, yMm: yMm - corner - below, cost: 1.1 },
      { xMm: xMm - corner - width, yMm: yMm + corner + above, cost: 1.2 },
    ];
  };
}

/** Spots for a label that must find room: round a disc in sixteen directions, ever farther out. */
export function spotsAround(disc: Disc, reachMm: number): (size: TextSize) => Spot[] {
  const beside = spotsBeside(disc);
  return (size) => {
    const spots = beside(size);
    const { width, above, below } = size;
    for (let gap = 1.5; gap <= reachMm; gap += 1.5) {
      for (let step = 0; step < 16; step++) {
        const angle = (step * Math.PI) / 8;
        const distance = disc.radiusMm + gap;
        // The nearest point of the box, not its middle, stands at that distance.
        const dx = Math.cos(angle) * (distance + width / 2);
        const dy = Math.sin(angle) * (distance + (above + below) / 2);
        spots.push({
          xMm: disc.xMm + dx - width / 2,
          yMm: disc.yMm + dy + (above - below) / 2,
          cost: 1.5 + 0.4 * gap,
        });
      }
    }
    return spots;
  };
}

/** Spots round a disc, and farther ones that a line must lead back from. */
export function spotsLed(disc: Disc, reachMm: number, ledReachMm: number): (size: TextSize) => Spot[] {
  const near = spotsAround(disc, reachMm);
  const far = spotsAround(disc, ledReachMm);
  return (size) => [
    ...near(size),
    ...far(size).map((spot): Spot => ({ ...spot, cost: spot.cost + 4, strays: true })),
  ];
}

/** Spots for the name of an area: on its middle, then ever farther round it, out to `reachMm`. */
export function spotsRound(middle: SheetPoint, reachMm: number): (size: TextSize) => Spot[] {
  return ({ width, above, below }) => {
    const spots: Spot[] = [];
    const put = (dx: number, dy: number): void => {
      spots.push({
        xMm: middle[0] + dx - width / 2,
        yMm: middle[1] + dy + (above - below) / 2,
        cost: 0.15 * Math.hypot(dx, dy),
      });
    };
    put(0, 0);
    for (let ring = 3; ring <= reachMm; ring += 3) {
      const steps = 8 + 2 * Math.round(ring / 3);
      for (let step = 0; step < steps; step++) {
        const angle = (2 * Math.PI * step) / steps;
        put(ring * Math.cos(angle), ring * Math.sin(angle));
      }
    }
    return spots;
  };
}

/** One spot only, its text centred on a point. */
export function spotAt(middle: SheetPoint): (size: TextSize) => Spot[] {
  return ({ width, above, below }) => [
    { xMm: middle[0] - width / 2, yMm: middle[1] + (above - below) / 2, cost: 0 },
  ];
}
