import { assertFiniteSample } from './assert-finite-sample';

/**
 * The value that a part p of the sample lies below, by straight interpolation between the ordered values: place
 * (n − 1)·p from the smallest (type 7 of R. J. Hyndman and Y. Fan, The American Statistician 50, 361 (1996)).
 * p = 0 and 1 are the extremes, ½ the median.
 *
 * Throws `RangeError` for an empty sample, a value that is not finite, or p outside 0 to 1.
 *
 * @example quantile([1, 2, 3, 4, 5], 0.25) // 2
 */
export function quantile(sample: ArrayLike<number>, p: number): number {
  assertFiniteSample(sample);
  if (sample.length === 0) throw new RangeError('an empty sample has no quantile');
  if (!(p >= 0 && p <= 1)) throw new RangeError(`a quantile needs a part between 0 and 1, not ${p}`);
  const sorted = Float64Array.from(sample).sort();
  const place = (sorted.length - 1) * p;
  const low = sorted[Math.floor(place)] ?? 0;
  const high = sorted[Math.ceil(place)] ?? low;
  const part = place - Math.floor(place);
  // Adding 0 makes a plain zero of −0, which sorts and prints otherwise.
  return (low === high ? low : low * (1 - part) + high * part) + 0;
}
