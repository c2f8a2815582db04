const GREEK = {
  α: 'alpha',
  β: 'beta',
  γ: 'gamma',
  δ: 'delta',
  ε: 'epsilon',
  ζ: 'zeta',
  η: 'eta',
  θ: 'theta',
  ι: 'iota',
  κ: 'kappa',
  λ: 'lambda',
  μ: 'mu',
  ν: 'nu',
  ξ: 'xi',
  ο: 'omicron',
  π: 'pi',
  ρ: 'rho',
  σ: 'sigma',
  τ: 'tau',
  υ: 'upsilon',
  φ: 'phi',
  χ: 'chi',
  ψ: 'psi',
  ω: 'omega',
} as const;

/**
 * A name without what people write differently: capitals, spaces, accents, punctuation, the typographic
 * superscript, 'Messier' for M, leading zeros of a catalogue number, Greek letters spelt out.
 */
export const foldName = (name: string): string =>
  name
    .normalize('NFKD')
    .toLowerCase()
    .replace(/[α-ω]/g, (letter) => GREEK[letter as keyof typeof GREEK] ?? letter)
    .replace(/[^a-z0-9]/g, '')
    .replace(/^messier(?=\d)/, 'm')
    .replace(/^(m|ngc|ic)0+(?=\d)/, '$1');
