/**
 * The sky cut into cells of about 2 by 2 degrees: 90 bands of declination, each cut into equal steps of right
 * ascension, fewer towards the poles, so that all cells are nearly equal in area. Cells are numbered from
 * the south pole up, and from 0h eastwards inside a band.
 */
export const BAND_COUNT = 90;
export const BAND_HEIGHT = Math.PI / BAND_COUNT;

const TURN = 2 * Math.PI;

const cellsInBand = (band: number): number =>
  Math.max(3, Math.round((TURN * Math.cos(-Math.PI / 2 + (band + 0.5) * BAND_HEIGHT)) / BAND_HEIGHT));

/** Number of the first cell of each band, with the count of all cells at the end. */
export const bandStarts: Uint32Array = (() => {
  const starts = new Uint32Array(BAND_COUNT + 1);
  for (let band = 0; band < BAND_COUNT; band++) starts[band + 1] = starts[band]! + cellsInBand(band);
  return starts;
})();

export const CELL_COUNT = bandStarts[BAND_COUNT]!;

/** Right ascension brought to 0 … 2π (2π excluded). */
export const wrapTurn = (raRad: number): number => {
  const wrapped = raRad - TURN * Math.floor(raRad / TURN);
  return wrapped >= 0 && wrapped < TURN ? wrapped : 0;
};

/** Band of a declination in radians; both poles belong to the outermost bands. */
export const bandOf = (decRad: number): number =>
  Math.min(BAND_COUNT - 1, Math.max(0, Math.floor((decRad + Math.PI / 2) / BAND_HEIGHT)));

/** Width in right ascension, radians, of the cells of a band. */
export const cellWidth = (band: number): number => TURN / (bandStarts[band + 1]! - bandStarts[band]!);

/** Southern edge of a band, radians. */
export const bandSouth = (band: number): number => -Math.PI / 2 + band * BAND_HEIGHT;

/** Number of the cell that holds a place; right ascension may be any angle. */
export const cellOf = (raRad: number, decRad: number): number => {
  const band = bandOf(decRad);
  const first = bandStarts[band]!;
  const column = Math.floor(wrapTurn(raRad) / cellWidth(band));
  return Math.min(first + column, bandStarts[band + 1]! - 1);
};

/** A hair wider than the cone, so that rounding never loses a star that lies on its rim. */
const SLACK = 1e-9;

/**
 * The greatest difference in right ascension from the cone's centre that the cone reaches between two
 * declinations: 0 where it does not reach, π where it closes round a pole. Spherical law of cosines; the
 * circle is widest at the declination where sin d = sin d0 / cos r, or at the nearer edge of the band.
 */
const reachInBand = (decRad: number, radiusRad: number, south: number, north: number): number => {
  if (radiusRad >= Math.PI / 2) return Math.PI;
  const widest = Math.asin(Math.max(-1, Math.min(1, Math.sin(decRad) / Math.cos(radiusRad))));
  const at = Math.max(south, Math.min(north, widest));
  const cosine = (Math.cos(radiusRad) - Math.sin(at) * Math.sin(decRad)) / (Math.cos(at) * Math.cos(decRad));
  if (cosine > 1) return 0;
  return cosine > -1 ? Math.acos(cosine) : Math.PI;
};

/**
 * Calls `visit` once with each cell that the cone may touch, with the cell's band. Right ascension may be any
 * angle, declination -π/2 … π/2, radius 0 … π. May name a few cells that the cone only nearly touches.
 */
export const visitCellsInCone = (
  raRad: number,
  decRad: number,
  radiusRad: number,
  visit: (cell: number, band: number) => void,
): void => {
  const radius = radiusRad + SLACK;
  const lowest = bandOf(decRad - radius);
  const highest = bandOf(decRad + radius);
  for (let band = lowest; band <= highest; band++) {
    const first = bandStarts[band]!;
    const columns = bandStarts[band + 1]! - first;
    const width = cellWidth(band);
    const south = Math.max(bandSouth(band), decRad - radius);
    const north = Math.min(bandSouth(band + 1), decRad + radius);
    const reach = reachInBand(decRad, radius, south, north) + SLACK;
    const from = Math.floor((raRad - reach) / width);
    const to = Math.floor((raRad + reach) / width);
    if (to - from + 1 >= columns) {
      for (let column = 0; column < columns; column++) visit(first + column, band);
      continue;
    }
    for (let column = from; column <= to; column++) {
      visit(first + (((column % columns) + columns) % columns), band);
    }
  }
};
