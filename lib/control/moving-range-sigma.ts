import { mean } from '@/lib/stats/mean';
import { median } from '@/lib/stats/median';
import { standardNormalQuantile } from '@/lib/stats/standard-normal';
import { MEAN_RANGE_OF_TWO } from './moving-range-factors';

/** How σ of single values is estimated from the distances between neighbours. */
export type MovingRangeEstimator = 'mean-moving-range' | 'median-moving-range';

/** The median distance of two normal values: √2 · Φ⁻¹(¾) = 0.9539 of their σ. */
const MEDIAN_RANGE_OF_TWO = Math.SQRT2 * standardNormalQuantile(0.75);

/**
 * σ of successive values from their moving ranges: the mean over d2(2) = 1.128 (NIST/SEMATECH e-Handbook, section
 * 6.3.2.2), or the median over 0.954, which a few jumps leave where it is, at the cost of scatter.
 *
 * Throws `RangeError` with fewer than two values or one that is not finite.
 *
 * @example movingRangeSigma([1, 2, 1, 2]) // 0.886
 */
export function movingRangeSigma(
  levels: readonly number[],
  estimator: MovingRangeEstimator = 'mean-moving-range',
): number {
  if (levels.length < 2) throw new RangeError('a moving range needs two values');
  const ranges = levels.slice(1).map((level, i) => Math.abs(level - (levels[i] ?? level)));
  return estimator === 'mean-moving-range'
    ? mean(ranges) / MEAN_RANGE_OF_TWO
    : median(ranges) / MEDIAN_RANGE_OF_TWO;
}
