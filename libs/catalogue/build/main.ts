/* Makes stars.bin, starNames.tsv and figures.tsv; see libs/catalogue/README.md. */
import { readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { writeFigures } from '../figureFile';
import { cataloguePath } from '../files';
import { packStars } from '../starFile';
import { type LabelledIndex, writeStarNames } from '../starLabels';
import { CATALOGUE_VERSION } from '../version';
import { readBrightStars } from './brightStars';
import { type MergedStar, mergeStars } from './merge';
import { type NamedPlace, chooseNames, readNamedPlaces } from './namedPlaces';
import { ARCSEC, nearbyIn, separation } from './nearby';
import { resolveFigures } from './figures';
import { readTycho } from './tycho';

const FAINTEST = 11;
/** Read deeper than FAINTEST, so that the match also sees stars whose V_T is fainter than their V. */
const FAINTEST_VT = 11.5;

const TYCHO = 'usr/share/astrometry/index-tycho2-07.littleendian.fits';
const BRIGHT = 'usr/share/xplanet/stars/BSC';
const NAMES = 'usr/share/libswe/ephe/sefstars.txt';

const NAMES_COMMENT = [
  'Letters and numbers: Bright Star Catalogue, 5th revised edition (Hoffleit & Warren 1991), public data, as',
  "carried by Debian's xplanet. Proper names: sefstars.txt of Debian's swe-basic-data (CC0 1.0).",
  'star: index in stars.bin; hr: Bright Star Catalogue number. Made by libs/catalogue/build/main.ts.',
];

const labelStars = (stars: readonly MergedStar[], chosen: readonly NamedPlace[]): LabelledIndex[] => {
  const near = nearbyIn(stars);
  const names = new Map<number, string>();
  for (const place of chosen) {
    const best = near(place, 12 * ARCSEC)
      .filter((i) => stars[i]!.bright !== null)
      .sort((a, b) => {
        const cost = (i: number): number =>
          separation(stars[i]!, place) / (4 * ARCSEC) + Math.abs(stars[i]!.magnitude - place.magnitude);
        return cost(a) - cost(b);
      })[0];
    if (best === undefined) throw new Error(`No star at the place of ${place.name} (${place.designation}).`);
    if (names.has(best)) throw new Error(`${place.name} and ${names.get(best)} are one star.`);
    names.set(best, place.name);
  }
  return stars.flatMap(({ bright }, index) => {
    if (!bright) return [];
    const { hr, bayerLetter, flamsteed, constellation } = bright;
    const bayer = bayerLetter && constellation ? `${bayerLetter} ${constellation}` : null;
    return [
      { index, label: { name: names.get(index) ?? null, bayer, bayerLetter, flamsteed, constellation, hr } },
    ];
  });
};

const FIGURES_COMMENT = [
  'Constellation figures: figures.txt resolved to J2000 places, degrees, by stars.bin. Apache-2.0 as the rest of the',
  'project. Made by libs/catalogue/build/main.ts; change figures.txt instead.',
];

const main = (folders: readonly string[]): void => {
  const [tychoFolder, brightFolder, namesFolder] = folders;
  if (!tychoFolder || !brightFolder || !namesFolder) {
    process.stderr.write(
      'Usage: node dist/libs/catalogue/build/main.js TYCHO2_FOLDER XPLANET_FOLDER SWE_FOLDER\n',
    );
    process.exitCode = 2;
    return;
  }
  const tycho = readTycho(join(tychoFolder, TYCHO), FAINTEST_VT);
  const bright = readBrightStars(readFileSync(join(brightFolder, BRIGHT), 'latin1'));
  const places = readNamedPlaces(readFileSync(join(namesFolder, NAMES), 'utf8'));
  const chosen = chooseNames(readFileSync(cataloguePath('build/properNames.txt'), 'utf8'), places);
  const { stars, report } = mergeStars(tycho, bright, places, FAINTEST);
  const { bytes, indexOf } = packStars(stars, CATALOGUE_VERSION);
  const labelled = labelStars(stars, chosen);
  const labels = labelled.map(({ index, label }) => ({ index: indexOf[index]!, label }));
  const figures = resolveFigures(
    readFileSync(cataloguePath('figures.txt'), 'utf8'),
    labelled.map(({ index, label }) => ({ ...stars[index]!, label })),
  );
  writeFileSync(cataloguePath('stars.bin'), bytes);
  writeFileSync(
    cataloguePath('starNames.tsv'),
    writeStarNames(labels, CATALOGUE_VERSION, stars.length, NAMES_COMMENT),
  );
  writeFileSync(cataloguePath('figures.tsv'), writeFigures(figures, FIGURES_COMMENT));
  const said = {
    tycho: tycho.length,
    bright: bright.length,
    stars: stars.length,
    bytes: bytes.length,
    ...report,
  };
  for (const [name, value] of Object.entries(said)) process.stdout.write(`${name}: ${value}\n`);
};

main(process.argv.slice(2));
