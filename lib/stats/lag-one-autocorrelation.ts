import { assertFiniteSample } from './assert-finite-sample';
import { autocorrelations } from './autocorrelations';
import { rootBetween } from './root-between';
import { standardNormalQuantile } from './standard-normal';

/**
 * The autocorrelation of a series with itself one step later: how far each value foretells the next one. Control
 * limits take successive values as independent; near ±1 they are not. See `autocorrelations`.
 *
 * `null` with fewer than two values or when all are equal. Throws `RangeError` for an empty series or a value
 * that is not finite.
 */
export function lagOneAutocorrelation(series: ArrayLike<number>): number | null {
  assertFiniteSample(series);
  return series.length === 1 ? null : (autocorrelations(series, 1)?.[0] ?? null);
}

/**
 * The lower confidence bound of the true lag-one autocorrelation ρ of which `r` was seen in n values of a first-order
 * autoregressive series: the ρ from which r lies just so many standard errors up. r is low by (1 + 4ρ)/n on average
 * (F. H. C. Marriott and J. A. Pope, Biometrika 41, 390 (1954)) and varies by (1 − ρ²)/n (M. S. Bartlett, J. Royal
 * Statistical Society Suppl. 8, 27 (1946)).
 *
 * Throws `RangeError` unless −1 ≤ r ≤ 1, n is a whole number of at least 8, and 0 < confidence < 1.
 */
export function lagOneLowerBound(r: number, n: number, confidence = 0.95): number {
  if (!(Math.abs(r) <= 1)) throw new RangeError(`no autocorrelation of ${r}`);
  if (!Number.isInteger(n) || n < 8) throw new RangeError(`no bound of the autocorrelation of ${n} values`);
  const z = standardNormalQuantile(confidence);
  const room = (rho: number): number =>
    rho - (1 + 4 * rho) / n + z * Math.sqrt(Math.max(0, 1 - rho * rho) / n) - r;
  const most = 1 - 2 / n;
  if (room(-1) >= 0) return -1;
  return room(most) <= 0 ? most : rootBetween(room, -1, most);
}
