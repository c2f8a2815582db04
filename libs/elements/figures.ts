/** A number for a message, to at most `digits` significant digits and without an idle tail of zeros. */
export function figure(value: number, digits = 8): string {
  return String(Number(value.toPrecision(digits)));
}

/**
 * How far a given value may be off because it was rounded: half a unit of its last digit, but never more than a
 * thousandth of it, for trailing zeros are lost in a number.
 */
export function rounding(value: number): number {
  const size = Math.abs(value);
  if (size === 0) return 1e-6;
  const text = String(size);
  const exponent = /e([+-]\d+)$/.exec(text);
  const point = text.indexOf('.');
  const decimals = point < 0 ? 0 : (exponent?.index ?? text.length) - point - 1;
  const half = 0.5 * 10 ** (Number(exponent?.[1] ?? 0) - decimals);
  return Math.max(Math.min(half, size * 1e-3), size * 1e-9);
}
