import type { Place } from './namedPlaces';
import { CELL_COUNT, cellOf, visitCellsInCone } from '../skyCells';

export const ARCSEC = Math.PI / 648000;

/** Angle between two places, radians (haversine: exact for small angles). */
export const separation = (a: Place, b: Place): number => {
  const north = Math.sin((a.decRad - b.decRad) / 2);
  const east = Math.sin((a.raRad - b.raRad) / 2);
  return 2 * Math.asin(Math.sqrt(north * north + Math.cos(a.decRad) * Math.cos(b.decRad) * east * east));
};

/** Gives a search for the indices of the stars within a radius of a place. */
export const nearbyIn = (stars: readonly Place[]): ((place: Place, radiusRad: number) => number[]) => {
  const members: number[][] = Array.from({ length: CELL_COUNT }, () => []);
  stars.forEach((star, i) => members[cellOf(star.raRad, star.decRad)]!.push(i));
  return (place, radiusRad) => {
    const found: number[] = [];
    visitCellsInCone(place.raRad, place.decRad, radiusRad, (cell) => {
      for (const i of members[cell]!) if (separation(place, stars[i]!) <= radiusRad) found.push(i);
    });
    return found;
  };
};
