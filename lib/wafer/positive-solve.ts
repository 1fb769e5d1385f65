/**
 * Solves (matrix + ridge·I)·x = right for a symmetric positive definite matrix, row by row in one flat array
 * of `size`² numbers, by Cholesky's factors (Golub and Van Loan, Matrix Computations, section 4.2, from
 * memory). Null where the sum is not positive definite.
 *
 * @example positiveSolve(Float64Array.of(3), 1, Float64Array.of(8)) // [2]
 */
export function positiveSolve(matrix: Float64Array, ridge: number, right: Float64Array): Float64Array | null {
  const size = right.length;
  if (matrix.length !== size * size)
    throw new RangeError(`${matrix.length} numbers are no ${size} × ${size}`);
  const lower = new Float64Array(size * size);
  for (let i = 0; i < size; i++) {
    const row = i * size;
    for (let j = 0; j <= i; j++) {
      const other = j * size;
      let sum = matrix[row + j]!;
      for (let k = 0; k < j; k++) sum -= lower[row + k]! * lower[other + k]!;
      if (i !== j) lower[row + j] = sum / lower[other + j]!;
      else if (sum + ridge > 0) lower[row + i] = Math.sqrt(sum + ridge);
      else return null;
    }
  }
  const x = right.slice();
  for (let i = 0; i < size; i++) {
    for (let k = 0; k < i; k++) x[i]! -= lower[i * size + k]! * x[k]!;
    x[i]! /= lower[i * size + i]!;
  }
  for (let i = size - 1; i >= 0; i--) {
    x[i]! /= lower[i * size + i]!;
    for (let k = 0; k < i; k++) x[k]! -= lower[i * size + k]! * x[i]!;
  }
  return x;
}
