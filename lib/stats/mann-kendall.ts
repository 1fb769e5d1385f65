import { assertFiniteSample } from './assert-finite-sample';
import { standardNormalCdf } from './standard-normal';

/** S: rising pairs less falling ones; its variance without a trend, for ties corrected; and p on both sides. */
export interface MannKendall {
  s: number;
  variance: number;
  p: number;
}

/**
 * The test of Mann and Kendall for a trend in a series, whatever its distribution and the form of the trend
 * (H. B. Mann, Econometrica 13, 245 (1945); M. G. Kendall, Rank Correlation Methods (1955), chapter 4 for ties). Up to
 * ten different values p is exact, counted over all orders; else S is taken as normal, corrected for continuity.
 * It takes the values as independent.
 *
 * `null` with fewer than four values or when all are equal. Throws `RangeError` for a value that is not finite.
 */
export function mannKendall(series: ArrayLike<number>): MannKendall | null {
  assertFiniteSample(series);
  const n = series.length;
  const values = Float64Array.from(series);
  let s = 0;
  for (let i = 1; i < n; i++) {
    const value = values[i] ?? 0;
    for (let j = 0; j < i; j++) {
      const before = values[j] ?? 0;
      s += (value > before ? 1 : 0) - (value < before ? 1 : 0);
    }
  }
  const sizes = tieSizes(values);
  const pairs = (m: number): number => m * (m - 1) * (2 * m + 5);
  const variance = (pairs(n) - sizes.reduce((sum, size) => sum + pairs(size), 0)) / 18;
  if (n < 4 || variance <= 0) return null;
  const exact = n <= 10 && sizes.length === n;
  const z = Math.max(0, Math.abs(s) - 1) / Math.sqrt(variance);
  return { s, variance, p: exact ? exactProbability(Math.abs(s), n) : 2 * standardNormalCdf(-z) };
}

/** How many values share each different value. */
function tieSizes(values: Float64Array): number[] {
  const sizes = new Map<number, number>();
  for (const value of values) sizes.set(value, (sizes.get(value) ?? 0) + 1);
  return [...sizes.values()];
}

/** The part of all orders of n values that have |S| at least so large: orders by their inversions, value by value. */
function exactProbability(s: number, n: number): number {
  let orders = [1];
  for (let m = 2; m <= n; m++) {
    const next = new Array<number>(orders.length + m - 1).fill(0);
    orders.forEach((count, i) => {
      for (let k = 0; k < m; k++) next[i + k] = (next[i + k] ?? 0) + count;
    });
    orders = next;
  }
  const most = (n * (n - 1)) / 2;
  let extreme = 0;
  let all = 0;
  orders.forEach((count, inversions) => {
    all += count;
    if (Math.abs(most - 2 * inversions) >= s) extreme += count;
  });
  return extreme / all;
}
