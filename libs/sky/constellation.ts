import { Constellation } from 'astronomy-engine';
import { HOUR, toDeg } from './angles';

/** The constellation (IAU boundaries) in which a J2000 place lies: abbreviation and Latin name. */
export function constellationOf(
  raRad: number,
  decRad: number,
): { readonly abbreviation: string; readonly name: string } {
  const { symbol, name } = Constellation(raRad / HOUR, toDeg(decRad));
  return { abbreviation: symbol, name };
}
