/**
 * The slope of a polynomial at `x`, its coefficients given from the constant upwards: c₁ + 2·c₂·x + 3·c₃·x² + …
 *
 * Without coefficients, or with a constant alone: 0. Throws nothing.
 *
 * @example polynomialSlope([1, 2, 3], 2) // 14
 */
export function polynomialSlope(coefficients: readonly number[], x: number): number {
  let sum = 0;
  for (let n = coefficients.length - 1; n >= 1; n--) sum = sum * x + n * (coefficients[n] ?? 0);
  return sum;
}
