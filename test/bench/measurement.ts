/** One figure of the benchmark beside what it is compared to, both from the same run. */
export interface Measurement {
  readonly name: string;
  readonly value: number;
  readonly unit: string;
  readonly comparedTo: string;
  readonly comparedValue: number;
  /** How many times better than what it is compared to; for memory and time, compared over value. */
  readonly ratio: number;
  /** More of the same run, in words. */
  readonly note?: string;
}

export function measurement(
  name: string,
  value: number,
  unit: string,
  comparedTo: string,
  comparedValue: number,
  note?: string,
): Measurement {
  return {
    name,
    value: round(value),
    unit,
    comparedTo,
    comparedValue: round(comparedValue),
    ratio: round(comparedValue / value),
    ...(note !== undefined && { note }),
  };
}

export function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[sorted.length >> 1]!;
}

/** Milliseconds that a piece of work takes. */
export function timed(work: () => void): number {
  const start = performance.now();
  work();
  return performance.now() - start;
}

/** Four significant figures. */
function round(value: number): number {
  return Number(value.toPrecision(4));
}
