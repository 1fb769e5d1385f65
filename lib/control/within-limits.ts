import { c4 } from '@/lib/stats/c4';
import { mean } from '@/lib/stats/mean';
import { sampleStandardDeviation } from '@/lib/stats/sample-standard-deviation';
import type { LimitSet, SubgroupPoint } from './limit-set';

/**
 * Limits of the spread within subgroups, at 0.135 and 99.865 % of a lognormal distribution: exp(m ± 3·s/c4) of the
 * logarithms. A spread of exactly zero has no logarithm and is left out; null with fewer than two others.
 *
 * Throws `RangeError` for a spread that is negative or not finite, or limits that no double can hold.
 */
export function withinLimits(baseline: readonly SubgroupPoint[]): LimitSet['within'] {
  const spreads = baseline.flatMap((point) => (point.within === null ? [] : [point.within]));
  if (spreads.some((spread) => !(spread >= 0 && Number.isFinite(spread))))
    throw new RangeError('a spread within is a number from zero up');
  const logs = spreads.filter((spread) => spread > 0).map(Math.log);
  const s = logs.length < 2 ? null : sampleStandardDeviation(logs);
  if (s === null) return null;
  const logMean = mean(logs);
  const logSigma = s / c4(logs.length);
  const upper = Math.exp(logMean + 3 * logSigma);
  if (!Number.isFinite(upper)) throw new RangeError('the spread within varies too much for a limit');
  return { logMean, logSigma, lower: Math.exp(logMean - 3 * logSigma), centre: Math.exp(logMean), upper };
}
