// Makes brightStars.tsv and messierTable.tsv, the outside values that the tests here compare with:
//
//   apt-get download xplanet astronomical-almanac
//   for package in *.deb; do dpkg -x $package ${package%%_*}; done
//   node test/reference/catalogue/extract.mjs xplanet astronomical-almanac
//
// Shares no code with libs/catalogue, so that a mistake in reading there shows here.
import { readFileSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

const [xplanet, almanac] = process.argv.slice(2);
if (!xplanet || !almanac)
  throw new Error('Usage: node extract.mjs XPLANET_FOLDER ASTRONOMICAL_ALMANAC_FOLDER');
const here = dirname(fileURLToPath(import.meta.url));
const linesOf = (path) =>
  readFileSync(path, 'latin1')
    .split('\n')
    .filter((line) => line.trim() && !line.startsWith('#'));

const brightStars = linesOf(join(xplanet, 'usr/share/xplanet/stars/BSC')).map((line) => {
  const [dec, hours, magnitude] = line.trim().split(/\s+/);
  const [hr] = line
    .slice(line.lastIndexOf('"') + 1)
    .trim()
    .split(/\s+/);
  return [hr, (Number(hours) * 15).toFixed(4), Number(dec).toFixed(4), magnitude];
});
writeFileSync(
  join(here, 'brightStars.tsv'),
  [
    '# Bright Star Catalogue, 5th revised edition (Hoffleit & Warren 1991), as carried by Debian xplanet 1.3.1-3.',
    '# Made by extract.mjs. J2000 degrees; right ascension is rounded to 0.0015 degrees in the source.',
    'hr\traDeg\tdecDeg\tmagnitude',
    ...brightStars.map((row) => row.join('\t')),
    '',
  ].join('\n'),
);

const table = linesOf(join(almanac, 'usr/share/aa/messier.cat')).filter((line) => /^\d/.test(line));
const messier = table.map((line) => {
  const [equinox, hours, minutes, seconds, degrees, arcminutes, arcseconds, , , , , magnitude, name] = line
    .trim()
    .split(/\s+/);
  // Where the degrees are 00 the table puts the sign before the minutes.
  const south = degrees.startsWith('-') || arcminutes.startsWith('-');
  const dec = Math.abs(Number(degrees)) + Math.abs(Number(arcminutes)) / 60 + Number(arcseconds) / 3600;
  const ra = 15 * (Number(hours) + Number(minutes) / 60 + Number(seconds) / 3600);
  return [name, equinox, ra.toFixed(4), (south ? -dec : dec).toFixed(4), Number(magnitude)];
});
writeFileSync(
  join(here, 'messierTable.tsv'),
  [
    '# Messier table (messier.cat) of Debian astronomical-almanac 5.6-7 (S. L. Moshier). Made by extract.mjs.',
    '# Mean equator and equinox of the year in the second column, degrees; 0 where the table gives no magnitude.',
    'name\tequinox\traDeg\tdecDeg\tmagnitude',
    ...messier.map((row) => row.join('\t')),
    '',
  ].join('\n'),
);
