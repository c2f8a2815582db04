import { dotDiameterMm } from './dots';
import type { DrawnStar } from './drawnStars';
import type { PairInset } from './inset';
import { sheetAngle } from './orientation';
import type { Plate } from './plate';
import type { Mark, SheetPoint } from './scene';

const arcsec = Math.PI / 180 / 3600;
/** Two dots closer than this are one to a reader, millimetres between their middles. */
const leastApartMm = 1;
const leastBetweenMm = 0.15;

/** True where a sheet of this scale shows both stars of a pair as dots of their own. */
export function isResolved(pair: PairInset, mmPerRadian: number, faintestMagnitude: number): boolean {
  const apart = pair.separationArcsec * arcsec * mmPerRadian;
  const [bright, faint] = pair.magnitudes;
  const radii = (dotDiameterMm(bright, faintestMagnitude) + dotDiameterMm(faint, faintestMagnitude)) / 2;
  return apart >= Math.max(leastApartMm, radii + leastBetweenMm);
}

/** The fainter star of a resolved double, unless the catalogue has put its dot there already. */
export function companionMarks(
  pair: PairInset,
  plate: Plate,
  at: SheetPoint,
  drawn: readonly DrawnStar[],
  faintestMagnitude: number,
  of: string,
): Mark[] {
  const apart = pair.separationArcsec * arcsec * plate.mmPerRadian;
  const angle = sheetAngle(plate.turn, (pair.positionAngleDeg * Math.PI) / 180);
  const x = at[0] + apart * Math.cos(angle);
  const y = at[1] + apart * Math.sin(angle);
  const isThere = drawn.some(
    (star) =>
      Math.hypot(star.at[0] - x, star.at[1] - y) < 0.3 * apart &&
      Math.abs(star.star.magnitude - pair.magnitudes[1]) < 1.5,
  );
  if (isThere) return [];
  return [
    {
      shape: 'circle',
      role: 'target',
      of,
      xMm: x,
      yMm: y,
      radiusMm: dotDiameterMm(pair.magnitudes[1], faintestMagnitude) / 2,
      stroke: null,
      fillGray: 0,
      layer: 'over',
      clipped: true,
    },
  ];
}
