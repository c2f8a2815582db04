import { type PacketTarget, type TargetFacts } from './content';

const LIGHT_KM_PER_S = 299_792.458;
const MOON_ARCMIN = 31;
const EARTH_KM = 12_742;
const YEAR_S = 31_557_600;

/** A number as a visitor can take it in: `figures` significant figures, thousands set apart by commas. */
export function roundWords(value: number, figures = 2): string {
  const rounded = Number(value.toPrecision(figures));
  if (rounded >= 1e9) return `${trimmed(rounded / 1e9)} billion`;
  if (rounded >= 1e6) return `${trimmed(rounded / 1e6)} million`;
  return trimmed(rounded);
}

function trimmed(value: number): string {
  return value.toLocaleString('en-GB', { maximumFractionDigits: 2 });
}

/** "628 million km away", "2.5 million light years away"; null where the distance is not known. */
export function distanceWords({ distanceKm, distanceLy }: TargetFacts): string | null {
  if (distanceKm !== null) return `${roundWords(distanceKm, 3)} km away`;
  return distanceLy === null ? null : `${roundWords(distanceLy)} light years away`;
}

/** How long its light was on the way: "35 minutes", "1,350 years"; null where the distance is not known. */
export function lightTimeWords({ distanceKm, distanceLy }: TargetFacts): string | null {
  if (distanceLy !== null) return `${roundWords(distanceLy)} years`;
  if (distanceKm === null) return null;
  const seconds = distanceKm / LIGHT_KM_PER_S;
  if (seconds < 10) return `${seconds.toFixed(1)} seconds`;
  if (seconds < 100) return `${String(Math.round(seconds))} seconds`;
  const minutes = seconds / 60;
  if (minutes < 100) return `${String(Math.round(minutes))} minutes`;
  if (seconds < YEAR_S / 50) return `${roundWords(minutes / 60, 2)} hours`;
  return `${roundWords(seconds / YEAR_S, 2)} years`;
}

/** Width in the sky beside the Moon's: "3.2° across, as wide as six full Moons"; null for a point. */
export function widthWords({ widthArcmin }: TargetFacts, isMoon: boolean): string | null {
  if (widthArcmin === null || widthArcmin <= 0) return null;
  const wide = `${angleWords(widthArcmin)} across`;
  if (isMoon) return wide;
  const moons = widthArcmin / MOON_ARCMIN;
  if (moons >= 1.5) {
    const times = roundWords(moons, moons < 10 ? 1 : 2);
    return `${wide}, ${times === '2' ? 'twice' : `${times} times`} as wide as the full Moon`;
  }
  if (moons >= 0.75) return `${wide}, about as wide as the full Moon`;
  return `${wide}, 1/${roundWords(1 / moons, 1 / moons < 10 ? 1 : 2)} as wide as the full Moon`;
}

/** "3.2°", "12′", "46″". */
export function angleWords(arcmin: number): string {
  if (arcmin >= 60) return `${roundWords(arcmin / 60, 2)}°`;
  return arcmin >= 1 ? `${roundWords(arcmin, 2)}′` : `${roundWords(arcmin * 60, 2)}″`;
}

/** True width: "140,000 km wide, 11 Earths side by side", "190 light years wide"; null where not known. */
export function trueWidthWords({ widthKm, widthLy }: TargetFacts): string | null {
  if (widthLy !== null) {
    const years = roundWords(widthLy);
    return `${years} light year${years === '1' ? '' : 's'} wide`;
  }
  if (widthKm === null) return null;
  const wide = `${roundWords(widthKm, 2)} km wide`;
  const earths = widthKm / EARTH_KM;
  return earths >= 1.5 && earths < 1000 ? `${wide}, ${roundWords(earths, 2)} Earths side by side` : wide;
}

/** All facts of a target as one line for a visitor. */
export function factLine(target: PacketTarget): string {
  const { facts } = target;
  const lightTime = lightTimeWords(facts);
  return sentence([
    phaseWords(target),
    distanceWords(facts),
    lightTime === null ? null : `its light set out ${lightTime} ago`,
    widthWords(facts, target.name === 'Moon'),
    trueWidthWords(facts),
  ]);
}

/** How much of its disc the Sun lights, where that shows: of the Moon, and of planets well short of full. */
function phaseWords({ name, kind, facts: { litShare } }: PacketTarget): string | null {
  if (litShare === null || (name !== 'Moon' && (kind !== 'planet' || litShare > 0.95))) return null;
  return `${String(Math.round(litShare * 100))}% of its face is lit`;
}

/** What a volunteer can add to the gloss: when the light left, and how far where that does not say it. */
export function spokenFacts({ facts }: PacketTarget): string {
  const lightTime = lightTimeWords(facts);
  if (facts.distanceLy !== null && lightTime !== null) return `Its light set out ${lightTime} ago.`;
  return sentence([distanceWords(facts), lightTime === null ? null : `light set out ${lightTime} ago`]);
}

/** Parts with a semicolon between them, a capital first and a full stop last; empty without any. */
function sentence(parts: readonly (string | null)[]): string {
  const words = parts.filter((part) => part !== null).join('; ');
  return words === '' ? '' : `${words[0]!.toUpperCase()}${words.slice(1)}.`;
}
