import { mirrorOf, turned } from './mirror';

/**
 * Turns a symmetric matrix into a tridiagonal one, in place (Golub and Van Loan, section 8.3, from memory): mirrors on
 * both sides, one for each column. Returns the mirrors in the order of their turning.
 */
export function tridiagonalised(matrix: readonly Float64Array[]): Float64Array[] {
  const size = matrix.length;
  const mirrors: Float64Array[] = [];
  for (let k = 0; k + 2 < size; k++) {
    const from = k + 1;
    const mirror = mirrorOf(
      Float64Array.from({ length: size - from }, (_, i) => matrix[from + i]![k]!),
      0,
    );
    if (mirror === null) continue;
    mirrors.push(mirror);
    turnBothSides(matrix, mirror, from);
    turned([mirror], matrix[k]!);
    for (let i = from; i < size; i++) matrix[i]![k] = matrix[k]![i]!;
  }
  return mirrors;
}

/** A − u·wᵀ − w·uᵀ with p = 2·A·u and w = p − (u·p)·u, on the rows and columns from `from` on. */
function turnBothSides(matrix: readonly Float64Array[], u: Float64Array, from: number): void {
  const size = u.length;
  const w = new Float64Array(size);
  let along = 0;
  for (let i = 0; i < size; i++) {
    const row = matrix[from + i]!;
    let sum = 0;
    for (let j = 0; j < size; j++) sum += row[from + j]! * u[j]!;
    w[i] = 2 * sum;
    along += u[i]! * w[i]!;
  }
  for (let i = 0; i < size; i++) w[i]! -= along * u[i]!;
  for (let i = 0; i < size; i++) {
    const row = matrix[from + i]!;
    for (let j = 0; j < size; j++) row[from + j]! -= u[i]! * w[j]! + w[i]! * u[j]!;
  }
}
