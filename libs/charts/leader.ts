import type { Disc } from './labels';
import { type Box, distanceToLine, type Line } from './lines';
import type { Mark, SceneLabel } from './scene';

/** A label this far from its disc needs a line to say whose it is, millimetres. */
const fromMm = 2.2;
const atBoxMm = 0.3;
/** Clear paper between a leader and a dot that is not its own. */
const dotGapMm = 0.25;

/** The line from a label's box to the disc it belongs to; null where the label stands right beside it. */
export function leaderTo([left, top, right, bottom]: Box, owner: Disc): Line | null {
  const x = Math.min(Math.max(owner.xMm, left), right);
  const y = Math.min(Math.max(owner.yMm, top), bottom);
  const length = Math.hypot(x - owner.xMm, y - owner.yMm);
  if (length - owner.radiusMm < fromMm) return null;
  const at = (mm: number) =>
    [owner.xMm + ((x - owner.xMm) * mm) / length, owner.yMm + ((y - owner.yMm) * mm) / length] as const;
  return [at(length - atBoxMm), at(owner.radiusMm + 0.2)];
}

/** True where a leader passes over no other disc. */
export function isLeaderFree(leader: Line, owner: Disc, discs: readonly Disc[]): boolean {
  const [[x0, y0], [x1, y1]] = leader;
  const [left, right] = x0 < x1 ? [x0, x1] : [x1, x0];
  const [top, bottom] = y0 < y1 ? [y0, y1] : [y1, y0];
  return discs.every((disc) => {
    const reach = disc.radiusMm + dotGapMm;
    // Nearly every disc is far away; comparing edges first spares it the distance.
    if (disc.xMm < left - reach || disc.xMm > right + reach) return true;
    if (disc.yMm < top - reach || disc.yMm > bottom + reach) return true;
    return disc === owner || distanceToLine([disc.xMm, disc.yMm], leader[0], leader[1]) > reach;
  });
}

/** The leaders of the labels that have one. */
export function leaderMarks(labels: readonly SceneLabel[]): Mark[] {
  return labels.flatMap(({ leader, of }): Mark[] =>
    leader === undefined
      ? []
      : [
          {
            shape: 'polyline',
            role: 'leader',
            of,
            points: leader,
            stroke: { widthPt: 0.4, gray: 0.2 },
            fillGray: null,
            layer: 'over',
            clipped: true,
          },
        ],
  );
}
