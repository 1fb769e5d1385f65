import { mean } from '@/lib/stats/mean';
import { sampleStandardDeviation } from '@/lib/stats/sample-standard-deviation';
import { movingSigmaVariance } from './limit-interval';
import { MEAN_RANGE_OF_TWO } from './moving-range-factors';
import { rangeLaw, sigmaWithin } from './spread-law';

/** Where a σ comes from: all values together, successive ones, or the spread within subgroups. */
export type SigmaEstimator = 'overall-s' | 'mean-moving-range' | 'pooled-s' | 'mean-range';

/** A σ with the degrees of freedom of a chi-square that scatters as it does; `s` is that chi-square's own deviation. */
export interface SigmaEstimate {
  estimator: SigmaEstimator;
  sigma: number;
  s: number;
  degreesOfFreedom: number;
}

/**
 * σ of single values or subgroups by one of its estimators, with the degrees of freedom that its scatter leaves it: an
 * unbiased σ̂ with the relative variance v scatters as χ with ν = 1/(2v) + 1/4 (P. B. Patnaik, Biometrika 37, 78 (1950),
 * for the mean range, from memory). The mean moving range keeps about 0.61·(n − 1): successive ranges share a value.
 *
 * `subgroups` of one value each for `overall-s` and `mean-moving-range`; for the former all values count as one sample.
 * `null` where there is no spread to take. Throws `RangeError` for a value that is not finite, or for moving ranges of
 * subgroups of several values.
 *
 * @example sigmaEstimate([[1], [3], [1], [3]], 'mean-moving-range')?.sigma // √π
 */
export function sigmaEstimate(
  subgroups: readonly (readonly number[])[],
  estimator: SigmaEstimator,
): SigmaEstimate | null {
  const unbiased = (sigma: number, variance: number): SigmaEstimate => {
    const degreesOfFreedom = 1 / (2 * variance) + 0.25;
    return { estimator, sigma, s: sigma * (1 - 1 / (4 * degreesOfFreedom)), degreesOfFreedom };
  };
  const several = subgroups.filter((values) => values.length > 1);
  if (estimator === 'mean-moving-range') {
    if (several.length > 0) throw new RangeError('moving ranges are of single values');
    const values = subgroups.flat();
    if (values.length < 2) return null;
    const ranges = values.slice(1).map((value, i) => Math.abs(value - (values[i] ?? value)));
    return unbiased(mean(ranges) / MEAN_RANGE_OF_TWO, movingSigmaVariance(values.length));
  }
  if (estimator === 'mean-range') {
    if (several.length === 0) return null;
    const weight = (n: number): number => (rangeLaw.unit(n) / rangeLaw.error(n)) ** 2;
    const weights = several.reduce((sum, { length }) => sum + weight(length), 0);
    return unbiased(sigmaWithin(several, rangeLaw), 1 / weights);
  }
  const samples = estimator === 'overall-s' ? [subgroups.flat()] : several;
  const degreesOfFreedom = samples.reduce((sum, { length }) => sum + length - 1, 0);
  if (!(degreesOfFreedom > 0)) return null;
  const squares = samples.reduce(
    (sum, values) => sum + (values.length - 1) * (sampleStandardDeviation(values) ?? 0) ** 2,
    0,
  );
  const s = Math.sqrt(squares / degreesOfFreedom);
  return { estimator, sigma: s, s, degreesOfFreedom };
}
