import { median } from './median';
import { standardNormalQuantile } from './standard-normal';

/** 1.4826: the σ of a normal distribution over its median absolute deviation. */
const PER_SIGMA = 1 / standardNormalQuantile(0.75);

/**
 * A spread that outliers hardly move: the median distance from the median, scaled by 1.4826 so that it estimates σ
 * of normal values (P. J. Rousseeuw and C. Croux, J. American Statistical Association 88, 1273 (1993)). In the unit
 * of the values; zero when more than half of them are equal.
 *
 * Throws `RangeError` for an empty sample or a value that is not finite.
 *
 * @example medianAbsoluteDeviation([1, 2, 3, 4, 100]) // 1.4826
 */
export function medianAbsoluteDeviation(sample: ArrayLike<number>): number {
  const centre = median(sample);
  return PER_SIGMA * median(Array.from(sample, (value) => Math.abs(value - centre)));
}
