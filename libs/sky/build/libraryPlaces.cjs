// Prints the planetary library's heliocentric places (J2000 equator, au) at the TT Julian dates it is given on
// standard input, one JSON array of numbers per body and line, for planetCorrections.py.
const { AstroTime, HelioVector } = require('astronomy-engine');
const { readFileSync } = require('node:fs');

const asked = JSON.parse(readFileSync(0, 'utf8'));
for (const [body, dates] of Object.entries(asked)) {
  const places = dates.flatMap((ttJd) => {
    const { x, y, z } = HelioVector(body, AstroTime.FromTerrestrialTime(ttJd - 2451545));
    return [x, y, z];
  });
  process.stdout.write(`${JSON.stringify(places)}\n`);
}
