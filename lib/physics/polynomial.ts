/**
 * A polynomial by Horner's scheme: `coefficients[0] + coefficients[1]·x + coefficients[2]·x² + …`.
 *
 * Undefined without coefficients: 0. Throws nothing.
 *
 * @example polynomial([1, 2, 3], 2) // 17
 */
export function polynomial(coefficients: readonly number[], x: number): number {
  let sum = 0;
  for (let n = coefficients.length - 1; n >= 0; n--) sum = sum * x + (coefficients[n] ?? 0);
  return sum;
}
