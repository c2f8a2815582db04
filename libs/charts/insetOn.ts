import type { StarCatalogue } from '#catalogue';
import { plateFor } from './aim';
import { isResolved } from './companion';
import { starsFor } from './drawnStars';
import type { LocalSky } from './horizon';
import type { Inset } from './inset';
import type { ChartRequest } from './request';
import type { PanelSize, Sheet } from './sheet';

/**
 * The inset a sheet bears: none at the eye scale, and none for a double star whose two dots the chart itself
 * tells apart, which is found by laying the sheet out without one.
 */
export function insetOn(
  stars: StarCatalogue,
  request: ChartRequest,
  fieldDeg: number,
  sky: LocalSky | null,
  layOut: (panel: PanelSize | null) => Sheet,
): Inset | null {
  const { inset, scale } = request;
  if (inset === undefined || scale === 'eye') return null;
  if (inset.kind !== 'pair') return inset;
  const plate = plateFor(request, fieldDeg, layOut(null).frame, sky);
  const { faintestMagnitude } = starsFor(stars, plate, scale, () => false);
  return isResolved(inset, plate.mmPerRadian, faintestMagnitude) ? null : inset;
}
