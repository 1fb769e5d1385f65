/**
 * Turns a column by mirrors (Householder reflections, Golub and Van Loan, Matrix Computations, section 5.1, from
 * memory), in place: v − 2·m·(m·v). A mirror is a unit vector and acts on as many of the last numbers as it has.
 */
export function turned(mirrors: readonly Float64Array[], column: Float64Array): void {
  for (const mirror of mirrors) {
    const from = column.length - mirror.length;
    let along = 0;
    for (let i = 0; i < mirror.length; i++) along += mirror[i]! * column[from + i]!;
    along *= 2;
    for (let i = 0; i < mirror.length; i++) column[from + i]! -= along * mirror[i]!;
  }
}

/**
 * The mirror that turns a vector onto its first axis: applied to it, only the first number is left. Null for a vector
 * of length `least` or less, which has no direction.
 */
export function mirrorOf(vector: Float64Array, least: number): Float64Array | null {
  const length = Math.hypot(...vector);
  if (!(length > least)) return null;
  const mirror = vector.slice();
  mirror[0]! += mirror[0]! < 0 ? -length : length;
  const scale = Math.hypot(...mirror);
  for (let i = 0; i < mirror.length; i++) mirror[i]! /= scale;
  return mirror;
}
