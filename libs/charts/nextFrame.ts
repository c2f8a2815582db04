import { type Plate } from './plate';
import { halfWidthOf, projectionAbout } from './projection';
import type { ChartRequest } from './request';
import type { Mark, SheetPoint } from './scene';

const steps = 72;

/**
 * The outline, on a wider sheet, of the narrower sheet that follows it: a square for binoculars, a circle for an
 * eyepiece, both about the target and with north where they print it.
 */
export function nextFrame(
  next: NonNullable<ChartRequest['next']>,
  plate: Plate,
  request: ChartRequest,
): (Mark & { readonly shape: 'polygon' })[] {
  const { raRad, decRad } = request.target;
  const sky = projectionAbout('gnomonic', raRad, decRad);
  const half = halfWidthOf('gnomonic', (next.fieldDeg * Math.PI) / 180);
  const points: SheetPoint[] = [];
  for (let step = 0; step < steps; step++) {
    const angle = (2 * Math.PI * step) / steps;
    const reach =
      next.scale === 'eyepiece'
        ? half
        : half / Math.max(Math.abs(Math.cos(angle)), Math.abs(Math.sin(angle)));
    const at = plate.toSheet(sky.inverse(reach * Math.cos(angle), reach * Math.sin(angle)));
    if (at === null) return [];
    points.push(at);
  }
  return [
    {
      shape: 'polygon',
      role: 'nextFrame',
      of: next.scale,
      points,
      stroke: { widthPt: 0.6, gray: 0, dashMm: nextFrameDashMm },
      fillGray: null,
      layer: 'over',
      clipped: true,
    },
  ];
}

export const nextFrameDashMm: readonly number[] = [2.4, 0.8, 0.5, 0.8];
