/**
 * How alike neighbouring residuals are, as a correlation: Moran's I, n·Σ eᵢeⱼ / (pairs·Σ eᵢ²) over pairs of
 * neighbours (Moran, Biometrika 37, 17 (1950), from memory). Near 0, for a fit's residuals a little below, where
 * each site scatters by itself; above where the surface passes over something. `pairs` holds the two sites of each
 * pair in turn. 0 without pairs or without residuals.
 *
 * @example neighbourCorrelation(Float64Array.of(1, 1, -1, -1), Int32Array.of(0, 1, 1, 2, 2, 3)) // 1/3
 */
export function neighbourCorrelation(residuals: Float64Array, pairs: Int32Array): number {
  let products = 0;
  for (let i = 0; i < pairs.length; i += 2) products += residuals[pairs[i]!]! * residuals[pairs[i + 1]!]!;
  let squares = 0;
  for (const residual of residuals) squares += residual * residual;
  if (pairs.length === 0 || squares === 0) return 0;
  return (2 * residuals.length * products) / (pairs.length * squares);
}
