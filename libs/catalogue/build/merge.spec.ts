import type { PlacedStar } from '../starFile';
import type { BrightStar } from './brightStars';
import { VT_MINUS_V, mergeStars } from './merge';
import type { NamedPlace } from './namedPlaces';
import { ARCSEC } from './nearby';

/** A star on the equator so many arcseconds east and north of 1h; V_T from V. */
const tycho = (east: number, north: number, magnitude: number): PlacedStar => ({
  raRad: Math.PI / 12 + east * ARCSEC,
  decRad: north * ARCSEC,
  magnitude: magnitude + VT_MINUS_V,
});

const bright = (hr: number, east: number, north: number, magnitude: number): BrightStar => ({
  ...tycho(east, north, magnitude),
  magnitude,
  hr,
  hd: null,
  bayerLetter: null,
  flamsteed: null,
  constellation: null,
});

const row = (east: number, north: number, magnitude: number, moved: number): NamedPlace => ({
  ...tycho(east, north, magnitude),
  magnitude,
  name: '',
  designation: '',
  earlier: { raRad: Math.PI / 12 + (east - moved) * ARCSEC, decRad: north * ARCSEC },
});

const merge = (
  stars: readonly PlacedStar[],
  entries: readonly BrightStar[],
  rows: readonly NamedPlace[] = [],
): { readonly hr: number | null; readonly east: number; readonly magnitude: number }[] =>
  mergeStars(stars, entries, rows, 11).stars.map(({ raRad, magnitude, bright: entry }) => ({
    hr: entry?.hr ?? null,
    east: Math.round(((raRad - Math.PI / 12) / ARCSEC) * 100) / 100,
    magnitude: Math.round(magnitude * 1000) / 1000,
  }));

describe('merging the catalogues', () => {
  it('makes one star of two entries: place from Tycho-2, magnitude from the Bright Star Catalogue', () => {
    expect(merge([tycho(0, 0, 5.1)], [bright(1, 2, 0, 5)])).toEqual([{ hr: 1, east: 0, magnitude: 5 }]);
  });

  it('adds a bright star that Tycho-2 lacks, and keeps an unrelated faint neighbour', () => {
    expect(merge([tycho(20, 0, 9)], [bright(1, 0, 0, 2)])).toEqual([
      { hr: null, east: 20, magnitude: 9 },
      { hr: 1, east: 0, magnitude: 2 },
    ]);
  });

  it('drops what is fainter than asked, but no bright star', () => {
    expect(merge([tycho(0, 0, 11.2), tycho(900, 0, 11.3)], [bright(1, 0, 0, 11.1)])).toEqual([
      { hr: 1, east: 0, magnitude: 11.1 },
    ]);
  });

  it('keeps the two stars of a pair apart and does not confuse them', () => {
    const pair = [tycho(0, 0, 4), tycho(9, 0, 6)];
    expect(merge(pair, [bright(2, 10, 0, 6.1), bright(1, 1, 0, 4)])).toEqual([
      { hr: 1, east: 0, magnitude: 4 },
      { hr: 2, east: 9, magnitude: 6.1 },
    ]);
  });

  it('joins a close companion whose light the entry includes', () => {
    expect(merge([tycho(0, 0, 6.75), tycho(4, 0, 6.75)], [bright(1, 2, 0, 6)])).toEqual([
      { hr: 1, east: 0, magnitude: 6 },
    ]);
  });

  it('leaves a close companion whose light the entry does not include', () => {
    expect(merge([tycho(0, 0, 6), tycho(4, 0, 7)], [bright(1, 0, 0, 6)])).toHaveLength(2);
  });

  it('finds a fast star where it stood at J1991.25, and brings it and its companion to J2000', () => {
    const stars = [tycho(-40, 0, 5), tycho(-30, 0, 9)];
    expect(merge(stars, [bright(1, 0, 0, 5)], [row(0, 0, 5, 40)])).toEqual([
      { hr: 1, east: 0, magnitude: 5 },
      { hr: null, east: 10, magnitude: 9 },
    ]);
  });

  it('gives no place of sefstars.txt to two stars', () => {
    const entries = [bright(1, 0, 0, 5), bright(2, 3, 0, 5.1)];
    expect(merge([], entries, [row(0.5, 0, 5, 0)])).toEqual([
      { hr: 1, east: 0.5, magnitude: 5 },
      { hr: 2, east: 3, magnitude: 5.1 },
    ]);
  });

  it('takes a variable star for itself whatever its magnitude, if it stands in its place', () => {
    expect(merge([tycho(1, 0, 7.5)], [bright(1, 0, 0, 3)])).toEqual([{ hr: 1, east: 1, magnitude: 3 }]);
  });
});
