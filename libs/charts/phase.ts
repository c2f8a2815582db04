import type { Mark, MarkRole, SheetPoint } from './scene';

/** Fuller than this no eye sees a phase. */
const fullFrom = 0.985;
const steps = 36;
/** The unlit part: grey enough to tell on a photocopy, not a large dark area. */
const darkGray = 0.72;

/**
 * The unlit part of a disc, as an area between its dark limb and the terminator (half an ellipse); none where
 * the disc is as good as full. `brightAngleRad` is the middle of the bright limb on the sheet, from right
 * through down.
 */
export function phaseMarks(
  at: SheetPoint,
  radiusMm: number,
  litFraction: number,
  brightAngleRad: number,
  role: MarkRole,
  of: string,
): Mark[] {
  if (litFraction > fullFrom) return [];
  const cos = Math.cos(brightAngleRad);
  const sin = Math.sin(brightAngleRad);
  const turned = (ahead: number, aside: number): SheetPoint => [
    at[0] + radiusMm * (ahead * cos - aside * sin),
    at[1] + radiusMm * (ahead * sin + aside * cos),
  ];
  const limb: SheetPoint[] = [];
  const terminator: SheetPoint[] = [];
  for (let step = 0; step <= steps; step++) {
    const angle = -Math.PI / 2 + (Math.PI * step) / steps;
    limb.push(turned(-Math.cos(angle), Math.sin(angle)));
    terminator.unshift(turned((1 - 2 * litFraction) * Math.cos(angle), Math.sin(angle)));
  }
  return [
    {
      shape: 'polygon',
      role,
      of,
      points: [...limb, ...terminator],
      stroke: { widthPt: 0.4, gray: 0 },
      fillGray: darkGray,
      layer: 'over',
      clipped: role === 'target',
    },
  ];
}
