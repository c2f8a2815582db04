/** Several functions of time fitted together, piece by piece, by Chebyshev series of one degree. */
export interface Chebyshev {
  readonly fromMs: number;
  readonly segmentMs: number;
  readonly segments: number;
  readonly components: number;
  readonly degree: number;
  /** [segment][component][order] */
  readonly coefficients: Float64Array;
}

/** Writes the components' values at an instant into `out`. */
export type Sampler = (utcMs: number, out: Float64Array) => void;

/** Fits `components` functions over at least [fromMs, toMs] (Press et al., Numerical Recipes, 5.8). */
export function fitChebyshev(
  sample: Sampler,
  components: number,
  fromMs: number,
  toMs: number,
  segmentMs: number,
  degree: number,
): Chebyshev {
  const nodes = degree + 1;
  const segments = Math.max(1, Math.ceil((toMs - fromMs) / segmentMs));
  const coefficients = new Float64Array(segments * components * nodes);
  const at = new Float64Array(components);
  const values = new Float64Array(components * nodes);
  const cosines = cosineTable(nodes);
  for (let segment = 0; segment < segments; segment++) {
    const middle = fromMs + (segment + 0.5) * segmentMs;
    for (let k = 0; k < nodes; k++) {
      sample(middle + (Math.cos((Math.PI * (k + 0.5)) / nodes) * segmentMs) / 2, at);
      for (let c = 0; c < components; c++) values[c * nodes + k] = at[c]!;
    }
    for (let c = 0; c < components; c++) {
      for (let j = 0; j < nodes; j++) {
        let sum = 0;
        for (let k = 0; k < nodes; k++) sum += values[c * nodes + k]! * cosines[j * nodes + k]!;
        coefficients[(segment * components + c) * nodes + j] = sum * (j === 0 ? 1 / nodes : 2 / nodes);
      }
    }
  }
  return { fromMs, segmentMs, segments, components, degree, coefficients };
}

/** Values of all components at an instant into `out`, by Clenshaw's recurrence; allocates nothing. */
export function evaluateChebyshev(fit: Chebyshev, utcMs: number, out: Float64Array): void {
  const { degree, components, coefficients } = fit;
  const position = (utcMs - fit.fromMs) / fit.segmentMs;
  const segment = Math.min(fit.segments - 1, Math.max(0, Math.floor(position)));
  const x = 2 * (position - segment) - 1;
  const twice = 2 * x;
  let base = segment * components * (degree + 1);
  for (let c = 0; c < components; c++, base += degree + 1) {
    let b1 = 0;
    let b2 = 0;
    for (let j = degree; j > 0; j--) {
      const b0 = coefficients[base + j]! + twice * b1 - b2;
      b2 = b1;
      b1 = b0;
    }
    out[c] = coefficients[base]! + x * b1 - b2;
  }
}

function cosineTable(nodes: number): Float64Array {
  const table = new Float64Array(nodes * nodes);
  for (let j = 0; j < nodes; j++) {
    for (let k = 0; k < nodes; k++) table[j * nodes + k] = Math.cos((Math.PI * j * (k + 0.5)) / nodes);
  }
  return table;
}
