const GREEK: Readonly<Record<string, string>> = {
  Alp: 'α', Bet: 'β', Gam: 'γ', Del: 'δ', Eps: 'ε', Zet: 'ζ', Eta: 'η', The: 'θ', Iot: 'ι', Kap: 'κ',
  Lam: 'λ', Mu: 'μ', Nu: 'ν', Xi: 'ξ', Omi: 'ο', Pi: 'π', Rho: 'ρ', Sig: 'σ', Tau: 'τ', Ups: 'υ',
  Phi: 'φ', Chi: 'χ', Psi: 'ψ', Ome: 'ω',
}; // prettier-ignore

const SUPERSCRIPTS = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/** One entry of the Bright Star Catalogue. Place J2000 in radians, V magnitude. */
export interface BrightStar {
  readonly hr: number;
  readonly hd: number | null;
  readonly raRad: number;
  readonly decRad: number;
  readonly magnitude: number;
  readonly bayerLetter: string | null;
  readonly flamsteed: number | null;
  readonly constellation: string | null;
}

const bayerLetter = (text: string, component: string): string | null => {
  const letter = GREEK[text.trim()];
  if (letter === undefined) return null;
  const digit = component.trim();
  return digit === '' ? letter : letter + SUPERSCRIPTS[Number(digit)]!;
};

/**
 * Reads the Bright Star Catalogue as Debian's xplanet carries it: declination in degrees, right ascension in
 * hours, V, name in the catalogue's own columns (Flamsteed number 3, Bayer letter 3, component 1,
 * constellation 3), HR, HD, SAO.
 */
export const readBrightStars = (text: string): BrightStar[] =>
  text
    .split('\n')
    .map((line, at) => ({ line, at }))
    .filter(({ line }) => line.trim() !== '' && !line.startsWith('#'))
    .map(({ line, at }) => {
      const parts = /^\s*(-?[\d.]+)\s+([\d.]+)\s+(-?[\d.]+)\s+"(.{10})"\s+(\d+)\s+(\d+)\s+(\d+)\s*$/.exec(
        line,
      );
      if (!parts) throw new Error(`Bright Star Catalogue, line ${at + 1}: cannot read "${line}".`);
      const name = parts[4]!;
      return {
        hr: Number(parts[5]),
        hd: Number(parts[6]) || null,
        raRad: (Number(parts[2]) * Math.PI) / 12,
        decRad: (Number(parts[1]) * Math.PI) / 180,
        magnitude: Number(parts[3]),
        bayerLetter: bayerLetter(name.slice(3, 6), name.slice(6, 7)),
        flamsteed: Number(name.slice(0, 3)) || null,
        constellation: name.slice(7).trim() || null,
      };
    });
