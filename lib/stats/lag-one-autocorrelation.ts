import { deviations } from './deviations';
import { meanDeviation } from './mean';

/**
 * The autocorrelation of a series with itself one step later: how far each value foretells the next one. Control
 * limits take successive values as independent; near ±1 they are not.
 *
 * r₁ = Σ (xᵢ − x̄)(xᵢ₊₁ − x̄) / Σ (xᵢ − x̄)², as in the NIST/SEMATECH e-Handbook, section 1.3.5.12.
 *
 * `null` with fewer than two values or when all are equal. Throws `RangeError` for an empty series or a value
 * that is not finite.
 */
export function lagOneAutocorrelation(series: ArrayLike<number>): number | null {
  const { values } = deviations(series);
  const centre = meanDeviation(values);
  let products = 0;
  let squares = 0;
  let previous: number | null = null;
  for (const value of values) {
    const distance = value - centre;
    squares += distance * distance;
    if (previous !== null) products += previous * distance;
    previous = distance;
  }
  return values.length < 2 || squares === 0 ? null : products / squares;
}
