import { rootBetween } from './root-between';

/**
 * The value x > 0 at which a distribution of positive values reaches p: the bracket grows from `start` by doubling or
 * halving, then `rootBetween`. Upper halves go by the upper tail, so that p near 1 keeps its digits.
 *
 * Throws `RangeError` unless 0 < p < 1, or where the quantile is beyond what a double can hold.
 */
export function positiveQuantile(
  p: number,
  start: number,
  lowerTail: (x: number) => number,
  upperTail: (x: number) => number,
): number {
  if (!(p > 0 && p < 1)) throw new RangeError(`a quantile needs a probability between 0 and 1, not ${p}`);
  const short = (x: number): number => (p < 0.5 ? lowerTail(x) - p : 1 - p - upperTail(x));
  let low = start;
  let high = start;
  while (short(low) > 0) low /= 2;
  while (short(high) < 0) high *= 2;
  if (low === 0 || !Number.isFinite(high)) throw new RangeError(`the quantile at ${p} is beyond a double`);
  return low === high ? low : rootBetween(short, low, high);
}
