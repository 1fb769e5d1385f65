import { autocorrelations } from './autocorrelations';
import { chiSquareUpperTail } from './chi-square';

/**
 * The test of Ljung and Box whether a series is without memory: Q = n(n + 2)·Σ rₖ²/(n − k) over the first lags, which
 * follows a chi-square distribution with as many degrees of freedom when successive values are independent
 * (G. M. Ljung and G. E. P. Box, Biometrika 65, 297 (1978)). Lags: a fifth of the values, at most ten.
 *
 * `null` with fewer than ten values or when all are equal. Throws `RangeError` for an empty series, a value that is not
 * finite, or lags that are no whole number from 1 to one less than the values.
 */
export function ljungBox(
  series: ArrayLike<number>,
  lags = Math.min(10, Math.floor(series.length / 5)),
): { statistic: number; lags: number; p: number } | null {
  const n = series.length;
  if (n > 0 && n < 10) return null;
  const correlations = autocorrelations(series, lags);
  if (correlations === null) return null;
  const sum = correlations.reduce((total, r, i) => total + (r * r) / (n - i - 1), 0);
  const statistic = n * (n + 2) * sum;
  return { statistic, lags, p: chiSquareUpperTail(statistic, lags) };
}
