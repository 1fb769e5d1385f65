/**
 * A polynomial by Horner's scheme: `coefficients[0] + coefficients[1]·x + coefficients[2]·x² + …`.
 *
 * Undefined without coefficients: 0. Throws nothing.
 *
 * @example polynomial([1, 2, 3], 2) // 17
 */
export function polynomial(coefficients: readonly number[], x: number): number {
  return coefficients.reduceRight((sum, coefficient) => sum * x + coefficient, 0);
}
