/**
 * The inverse of a symmetric positive definite matrix by Cholesky's factors, row by row in one flat
 * array of `size`² numbers (Golub and Van Loan, Matrix Computations, section 4.2, from memory). Written out because a screened
 * wafer asks for it some twenty times. Null where the matrix is not positive definite.
 *
 * @example positiveInverse(Float64Array.of(4), 1) // [0.25]
 */
export function positiveInverse(matrix: Float64Array, size: number): Float64Array | null {
  if (matrix.length !== size * size)
    throw new RangeError(`${matrix.length} numbers are no ${size} × ${size}`);
  const lower = new Float64Array(size * size);
  for (let i = 0; i < size; i++) {
    for (let j = 0; j <= i; j++) {
      let sum = matrix[i * size + j]!;
      for (let k = 0; k < j; k++) sum -= lower[i * size + k]! * lower[j * size + k]!;
      if (i !== j) lower[i * size + j] = sum / lower[j * size + j]!;
      else if (sum > 0) lower[i * size + i] = Math.sqrt(sum);
      else return null;
    }
  }
  const inverse = new Float64Array(size * size);
  for (let column = 0; column < size; column++) {
    for (let i = column; i < size; i++) {
      let sum = i === column ? 1 : 0;
      for (let k = column; k < i; k++) sum -= lower[i * size + k]! * inverse[k * size + column]!;
      inverse[i * size + column] = sum / lower[i * size + i]!;
    }
  }
  for (let i = 0; i < size; i++) {
    for (let j = 0; j <= i; j++) {
      let sum = 0;
      for (let k = i; k < size; k++) sum += inverse[k * size + i]! * inverse[k * size + j]!;
      lower[i * size + j] = sum;
    }
  }
  for (let i = 0; i < size; i++) {
    for (let j = 0; j <= i; j++) {
      inverse[i * size + j] = lower[i * size + j]!;
      inverse[j * size + i] = lower[i * size + j]!;
    }
  }
  return inverse;
}
