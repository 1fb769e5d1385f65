import { standardNormalCdf } from '@/lib/stats/standard-normal';

/**
 * The part of a standard normal distribution between two values, either of which may be infinite. Taken in the
 * lower half where both lie above the middle, so that small parts keep their digits.
 *
 * Throws `RangeError` for a value that is not a number, or a lower one above the upper.
 *
 * @example normalBetween(-3, 3) // 0.9973002
 */
export function normalBetween(low: number, high: number): number {
  if (!(low <= high)) throw new RangeError(`no normal probability from ${low} to ${high}`);
  if (low > 0) return normalBetween(-high, -low);
  return Math.max(0, below(high) - below(low));
}

function below(z: number): number {
  return z <= -38 ? 0 : z >= 38 ? 1 : standardNormalCdf(z);
}
