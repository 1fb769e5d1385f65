import { assertFiniteSample } from './assert-finite-sample';
import { kthSmallest } from './kth-smallest';
import { mannKendall } from './mann-kendall';
import { standardNormalQuantile } from './standard-normal';

/** A slope per unit of the place, with its interval. */
export interface TheilSen {
  slope: number;
  low: number;
  high: number;
}

/**
 * The slope of a series that outliers hardly move: the median of the slopes of all pairs of points (H. Theil,
 * Proc. Koninklijke Nederlandse Akademie van Wetenschappen A 53, 386 (1950)), with the interval of P. K. Sen,
 * J. American Statistical Association 63, 1379 (1968), section 4: the pairs so many standard deviations of Kendall's S
 * away from the middle. `places` say where along the axis each value stands (times, or 1, 2, 3, …), rising; pairs at
 * the same place have no slope and are left out.
 *
 * `null` with fewer than four values, or when all values are equal or at one place. Throws `RangeError` for lists of
 * different length, places that fall, a number that is not finite, or unless 0 < confidence < 1.
 *
 * @example theilSen([0, 1, 2, 3, 4], [0, 2, 4, 6, 9])?.slope // 2
 */
export function theilSen(
  places: ArrayLike<number>,
  values: ArrayLike<number>,
  confidence = 0.95,
): TheilSen | null {
  assertFiniteSample(places);
  if (places.length !== values.length) throw new RangeError('each value needs its place');
  const z = standardNormalQuantile((1 + confidence) / 2);
  const trend = mannKendall(values);
  const slopes = pairSlopes(Float64Array.from(places), Float64Array.from(values));
  if (trend === null || slopes.length === 0) return null;
  const reach = z * Math.sqrt(trend.variance);
  const pairs = slopes.length;
  const low = Math.max(0, Math.round((pairs - reach) / 2) - 1);
  const high = Math.min(pairs - 1, Math.round((pairs + reach) / 2));
  const middle = kthSmallest(slopes, Math.floor(pairs / 2));
  const other = pairs % 2 === 1 ? middle : kthSmallest(slopes, pairs / 2 - 1);
  return {
    slope: (middle + other) / 2,
    low: kthSmallest(slopes, low),
    high: kthSmallest(slopes, high),
  };
}

function pairSlopes(places: Float64Array, values: Float64Array): Float64Array {
  const n = places.length;
  const slopes = new Float64Array((n * (n - 1)) / 2);
  let count = 0;
  for (let i = 1; i < n; i++) {
    const [place, value] = [places[i] ?? 0, values[i] ?? 0];
    if (place < (places[i - 1] ?? 0)) throw new RangeError('places must not fall');
    for (let j = 0; j < i; j++) {
      const run = place - (places[j] ?? 0);
      if (run > 0) slopes[count++] = (value - (values[j] ?? 0)) / run;
    }
  }
  return slopes.subarray(0, count);
}
