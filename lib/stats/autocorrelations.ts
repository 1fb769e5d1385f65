import { deviations } from './deviations';
import { meanDeviation } from './mean';

/**
 * The autocorrelations of a series with itself 1, 2, … `lags` steps later:
 * rₖ = Σ (xᵢ − x̄)(xᵢ₊ₖ − x̄) / Σ (xᵢ − x̄)², as in the NIST/SEMATECH e-Handbook, section 1.3.5.12.
 *
 * `null` when all values are equal. Throws `RangeError` for an empty series, a value that is not finite, or unless the
 * lags are a whole number from 1 to one less than the values.
 */
export function autocorrelations(series: ArrayLike<number>, lags: number): number[] | null {
  const { values } = deviations(series);
  const n = values.length;
  if (!Number.isInteger(lags) || lags < 1 || lags >= n)
    throw new RangeError(`no ${lags} lags of ${n} values`);
  const centre = meanDeviation(values);
  const distances = values.map((value) => value - centre);
  const products = (lag: number): number => {
    let sum = 0;
    for (let i = lag; i < n; i++) sum += (distances[i] ?? 0) * (distances[i - lag] ?? 0);
    return sum;
  };
  const squares = products(0);
  return squares === 0 ? null : Array.from({ length: lags }, (_, i) => products(i + 1) / squares);
}
