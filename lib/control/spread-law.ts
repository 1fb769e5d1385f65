import { c4 } from '@/lib/stats/c4';
import { chiSquareQuantile } from '@/lib/stats/chi-square';
import { rangeConstants, rangeQuantile } from '@/lib/stats/range-distribution';
import { sampleStandardDeviation } from '@/lib/stats/sample-standard-deviation';
import { standardNormalCdf } from '@/lib/stats/standard-normal';

/**
 * How a measure of spread within a subgroup behaves for n normal values with σ = 1: its expected value `unit`, its
 * own standard deviation `error`, and its value at a probability.
 */
export interface SpreadLaw {
  name: 'range' | 's';
  of(values: readonly number[]): number | null;
  unit(n: number): number;
  error(n: number): number;
  quantile(p: number, n: number): number;
}

/** The range: d2, d3 and the distribution of the range. */
export const rangeLaw: SpreadLaw = {
  name: 'range',
  of: (values) => (values.length < 2 ? null : Math.max(...values) - Math.min(...values)),
  unit: (n) => rangeConstants(n).d2,
  error: (n) => rangeConstants(n).d3,
  quantile: rangeQuantile,
};

/** The sample standard deviation: c4 and chi-square. */
export const standardDeviationLaw: SpreadLaw = {
  name: 's',
  of: (values) => (values.length < 2 ? null : sampleStandardDeviation(values)),
  unit: c4,
  error: (n) => Math.sqrt(1 - c4(n) ** 2),
  quantile: (p, n) => Math.sqrt(chiSquareQuantile(p, n - 1) / (n - 1)),
};

/**
 * σ within subgroups from their spreads: the mean of spread/unit, weighted by (unit/error)², the weights of least
 * variance (I. W. Burr, J. Quality Technology 1, 163 (1969), from memory). With subgroups of one size it is the
 * mean range over d2, or mean s over c4.
 *
 * Throws `RangeError` when no subgroup has two values.
 */
export function sigmaWithin(subgroups: readonly (readonly number[])[], law: SpreadLaw): number {
  let sum = 0;
  let weights = 0;
  for (const values of subgroups) {
    const spread = law.of(values);
    if (spread === null) continue;
    const unit = law.unit(values.length);
    const weight = (unit / law.error(values.length)) ** 2;
    sum += (weight * spread) / unit;
    weights += weight;
  }
  if (weights === 0) throw new RangeError('no subgroup of the baseline has two values');
  return sum / weights;
}

/** Probability of a normal value beyond three σ on one side, 0.135 %. */
const ONE_SIDE = standardNormalCdf(-3);

/**
 * Centre, standard deviation and limits of a spread of n values at a given σ: `classical` is centre ± 3 standard
 * deviations, not below zero (D3, D4, B3, B4 of ASTM MNL7); `probability` leaves 0.135 % beyond each limit.
 */
export function spreadLimits(
  law: SpreadLaw,
  n: number,
  sigma: number,
  kind: 'classical' | 'probability',
): { centre: number; sigma: number; lower: number; upper: number } {
  const [unit, error] = [law.unit(n), law.error(n)];
  const lower = kind === 'classical' ? Math.max(0, unit - 3 * error) : law.quantile(ONE_SIDE, n);
  const upper = kind === 'classical' ? unit + 3 * error : law.quantile(1 - ONE_SIDE, n);
  return { centre: unit * sigma, sigma: error * sigma, lower: lower * sigma, upper: upper * sigma };
}
