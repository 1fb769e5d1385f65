import { c4 } from '@/lib/stats/c4';
import { standardNormalQuantile } from '@/lib/stats/standard-normal';
import type { LimitSet } from './limit-set';
import { MEAN_RANGE_OF_TWO } from './moving-range-factors';

export interface Interval {
  low: number;
  high: number;
}

/** How far each limit might lie elsewhere, had the same process been studied on other days. */
export interface LimitIntervals {
  level: { lower: Interval; centre: Interval; upper: Interval };
  within: { lower: Interval; upper: Interval } | null;
}

/**
 * The interval of each level limit and each limit of the spread within, that holds the limit of the true process
 * with about the given confidence. It is what "young" limits are drawn with.
 *
 * Level: x̄ ± 3σ̂ has the variance σ²/n + 9·Var(σ̂), for x̄ and the mean moving range are uncorrelated. Neighbouring
 * ranges share a point, so with m = n − 1 ranges Var(mean range) = σ²·[m·(2 − 4/π) + 2(m − 1)·c]/m². Here c is
 * the covariance of neighbours, E|U||V| − 4/π with E|U||V| = (2/π)·Var·(√(1 − ρ²) + ρ·asin ρ), Var = 2, ρ = −½.
 * J. D. Cryer and T. P. Ryan, J. Quality Technology 22, 187 (1990), give this variance (from memory; checked
 * against simulation). The limit is then taken as normal, with σ̂ for σ.
 * Within: the same on the logarithms with s/c4, whose variance is σ²·(1 − c4²)/c4² (ASTM MNL7), n as in the set.
 *
 * Throws `RangeError` unless 0 < confidence < 1 and the set has a baseline of at least two.
 */
export function limitInterval(limits: LimitSet, confidence = 0.9): LimitIntervals {
  if (!(confidence > 0 && confidence < 1)) throw new RangeError(`no confidence of ${confidence}`);
  const { n } = limits;
  if (!Number.isInteger(n) || n < 2) throw new RangeError(`no interval from a baseline of ${n}`);
  const z = standardNormalQuantile((1 + confidence) / 2);
  const { centre, sigma, lower, upper } = limits.level;
  const reach = z * sigma * Math.sqrt(1 / n + 9 * movingSigmaVariance(n));
  return {
    level: {
      lower: around(lower, reach),
      centre: around(centre, (z * sigma) / Math.sqrt(n)),
      upper: around(upper, reach),
    },
    within: limits.within && withinInterval(limits.within, n, z),
  };
}

const NEIGHBOUR_COVARIANCE = (4 / Math.PI) * (Math.sqrt(0.75) + Math.PI / 12 - 1);

/** Variance of (mean moving range)/d2 of n independent normal values, in units of σ². */
export function movingSigmaVariance(n: number): number {
  const ranges = n - 1;
  const sum = ranges * (2 - 4 / Math.PI) + 2 * (ranges - 1) * NEIGHBOUR_COVARIANCE;
  return sum / (ranges * MEAN_RANGE_OF_TWO) ** 2;
}

function withinInterval(
  within: NonNullable<LimitSet['within']>,
  n: number,
  z: number,
): LimitIntervals['within'] {
  const reach = z * within.logSigma * Math.sqrt(1 / n + 9 * (1 / c4(n) ** 2 - 1));
  const factor = Math.exp(reach);
  if (!Number.isFinite(within.upper * factor))
    throw new RangeError('the interval of the limit is not finite');
  const scaled = (limit: number) => ({ low: limit / factor, high: limit * factor });
  return { lower: scaled(within.lower), upper: scaled(within.upper) };
}

function around(value: number, reach: number): Interval {
  return { low: value - reach, high: value + reach };
}
