import { COMET_POINTS } from './mpcComet';
import { MINOR_PLANET_POINTS } from './mpcMinorPlanet';

/** What a line of a fixed-column file looks like. */
export type LineKind = 'comet' | 'minorPlanet' | 'blank' | 'rule' | 'prose' | 'unknown';

const POINT = 46;
const FEWEST_POINTS = 4;

/**
 * Tells the two one-line formats from each other and from everything else by where their decimal points stand.
 * Prose (headers of published files) is text with few figures in it; a rule is a line of dashes.
 */
export function lineKind(line: string): LineKind {
  let minorPlanet = 0;
  for (const at of MINOR_PLANET_POINTS) if (line.charCodeAt(at) === POINT) minorPlanet++;
  if (minorPlanet === MINOR_PLANET_POINTS.length) return 'minorPlanet';
  let comet = 0;
  for (const at of COMET_POINTS) if (line.charCodeAt(at) === POINT) comet++;
  if (comet >= FEWEST_POINTS || minorPlanet >= FEWEST_POINTS) {
    return comet > minorPlanet ? 'comet' : 'minorPlanet';
  }
  return otherKind(line);
}

function otherKind(line: string): LineKind {
  const text = line.trim();
  if (text === '' || text.startsWith('#')) return 'blank';
  if (/^[-=_]{5,}$/.test(text)) return 'rule';
  let figures = 0;
  let marks = 0;
  for (let i = 0; i < text.length && i < 400; i++) {
    const code = text.charCodeAt(i);
    if (code === 32) continue;
    marks++;
    if (code >= 48 && code <= 57) figures++;
  }
  return figures * 4 < marks ? 'prose' : 'unknown';
}
