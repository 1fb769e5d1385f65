/**
 * Solves (T + ridge·I)·x = right for a symmetric positive definite tridiagonal T, given by its diagonal and the numbers
 * beside it, by its factors L·D·Lᵀ (Golub and Van Loan, Matrix Computations, section 4.3, from memory): some ten
 * operations a row. Null where the sum is not positive definite.
 *
 * @example tridiagonalSolve(Float64Array.of(3), Float64Array.of(), 1, Float64Array.of(8)) // [2]
 */
export function tridiagonalSolve(
  diagonal: Float64Array,
  beside: Float64Array,
  ridge: number,
  right: Float64Array,
): Float64Array | null {
  const size = diagonal.length;
  if (right.length !== size || beside.length !== Math.max(0, size - 1))
    throw new RangeError(`${beside.length} numbers beside a diagonal of ${size}, for ${right.length}`);
  const pivots = new Float64Array(size);
  const x = right.slice();
  for (let i = 0; i < size; i++) {
    const factor = i === 0 ? 0 : beside[i - 1]! / pivots[i - 1]!;
    const pivot = diagonal[i]! + ridge - (i === 0 ? 0 : factor * beside[i - 1]!);
    if (!(pivot > 0)) return null;
    pivots[i] = pivot;
    if (i > 0) x[i]! -= factor * x[i - 1]!;
  }
  for (let i = size - 1; i >= 0; i--) {
    x[i]! /= pivots[i]!;
    if (i + 1 < size) x[i]! -= (beside[i]! / pivots[i]!) * x[i + 1]!;
  }
  return x;
}
