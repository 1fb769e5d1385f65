import { mean } from '@/lib/stats/mean';
import { betweenLimits } from './between-limits';
import { MEAN_RANGE_OF_TWO, MOVING_RANGE_CLASSICAL, MOVING_RANGE_PROBABILITY } from './moving-range-factors';
import { movingRangeSigma, type MovingRangeEstimator } from './moving-range-sigma';
import { withinLimits } from './within-limits';

export { limitAge, type LimitAge } from './limit-age';
export { limitInterval, type Interval, type LimitIntervals } from './limit-interval';

/**
 * One rational subgroup as the charts see it: its charted `level`, the relative spread `within` its wafers in
 * percent, the standard deviation `between` its wafers' levels (null with one wafer), and how many `wafers` it has.
 */
export interface SubgroupPoint {
  level: number;
  within: number | null;
  between: number | null;
  wafers: number;
}

/** Limits of the three-way chart, and of the spread between the wafers of a subgroup. */
export interface LimitSet {
  /** Subgroups in the baseline. */
  n: number;
  level: { centre: number; sigma: number; lower: number; upper: number };
  movingRange: { centre: number; upper: number };
  within: { logMean: number; logSigma: number; lower: number; centre: number; upper: number } | null;
  /** `wafers`: the subgroup size the two figures hold for; subgroups of another size get their own limit. */
  between: { centre: number; upper: number; wafers?: number } | null;
}

/**
 * The control limits that a baseline of subgroups sets.
 *
 * Level: centre ± 3σ with σ = mean moving range / d2(2), as for individuals in the NIST/SEMATECH e-Handbook,
 * section 6.3.2.2: from one subgroup to the next, never from the spread within a wafer, which is systematic; or from
 * the median moving range, which a few jumps in the baseline do not widen (`estimator`).
 * Moving range: centre d2(2)·σ, upper limit `probability` (3.760 × mean, the default) or `classical` (3.267 × mean).
 * Within: limits at 0.135 and 99.865 % of a lognormal distribution, exp(m ± 3·s/c4) of the logarithms; null with
 * fewer than two subgroups of positive spread. Between: pooled over subgroups of two wafers or more, upper limit
 * the 99.73 % point of chi-square; null where no subgroup has two.
 *
 * Throws `RangeError` with fewer than two subgroups, or a value that is not finite, or a negative spread.
 *
 * @example limitSet([1, 2, 1, 2].map((level) => ({ level, within: null, between: null, wafers: 1 }))).level.centre // 1.5
 */
export function limitSet(
  baseline: readonly SubgroupPoint[],
  options: { movingRange?: 'probability' | 'classical'; estimator?: MovingRangeEstimator } = {},
): LimitSet {
  if (baseline.length < 2) throw new RangeError('a baseline needs at least two subgroups');
  const levels = baseline.map((point) => point.level);
  const centre = mean(levels);
  const sigma = movingRangeSigma(levels, options.estimator);
  const meanRange = sigma * MEAN_RANGE_OF_TWO;
  const factor = options.movingRange === 'classical' ? MOVING_RANGE_CLASSICAL : MOVING_RANGE_PROBABILITY;
  return {
    n: baseline.length,
    level: { centre, sigma, lower: centre - 3 * sigma, upper: centre + 3 * sigma },
    movingRange: { centre: meanRange, upper: factor * meanRange },
    within: withinLimits(baseline),
    between: betweenLimits(baseline),
  };
}
