import { mean } from '@/lib/stats/mean';
import { sampleStandardDeviation } from '@/lib/stats/sample-standard-deviation';
import { standardNormalQuantile } from '@/lib/stats/standard-normal';
import type { Specification, IndexWithInterval } from './capability';

/**
 * Pp and Ppk of a skewed figure, such as a non-uniformity, by percentiles instead of σ: the specification over the
 * distance from the 0.135 to the 99.865 % point, and the median's distance to a limit over its distance to the
 * percentile on that side (ISO 22514-2). The percentiles are those of a lognormal distribution fitted to the values,
 * as limits of the spread within wafers are; no sample of a few hundred holds them itself.
 *
 * 95 % intervals from the scatter of the logarithms' mean and s, carried through by their slopes, on the logarithm of
 * the index where it is positive.
 *
 * `null` when all values are equal. Throws `RangeError` for a value that is not finite and positive, fewer than two, or
 * no limit.
 */
export function percentileCapability(
  values: readonly number[],
  { lower, upper }: Pick<Specification, 'lower' | 'upper'>,
): { pp: IndexWithInterval | null; ppk: IndexWithInterval } | null {
  if (values.some((value) => !(value > 0))) throw new RangeError('a lognormal figure is above zero');
  const logs = values.map(Math.log);
  const [m, s] = [mean(logs), sampleStandardDeviation(logs)];
  if (s === null) throw new RangeError('one value has no spread');
  if (lower === null && upper === null) throw new RangeError('name a limit of the specification');
  if (s === 0) return null;
  const above = (centre: number, spread: number): number =>
    upper === null ? Infinity : (upper / Math.exp(centre) - 1) / Math.expm1(3 * spread);
  const below = (centre: number, spread: number): number =>
    lower === null ? Infinity : (1 - lower / Math.exp(centre)) / -Math.expm1(-3 * spread);
  const width = (centre: number, spread: number): number =>
    ((upper ?? 0) - (lower ?? 0)) / (2 * Math.exp(centre) * Math.sinh(3 * spread));
  const withInterval = (index: (centre: number, spread: number) => number): IndexWithInterval => {
    const value = index(m, s);
    const step = 1e-5 * s;
    const byCentre = (index(m + step, s) - index(m - step, s)) / (2 * step);
    const bySpread = (index(m, s + step) - index(m, s - step)) / (2 * step);
    const variance = byCentre ** 2 / values.length + bySpread ** 2 / (2 * (values.length - 1));
    const reach = standardNormalQuantile(0.975) * s * Math.sqrt(variance);
    const interval =
      value > 0
        ? { low: value * Math.exp(-reach / value), high: value * Math.exp(reach / value) }
        : { low: value - reach, high: value + reach };
    return { value, interval };
  };
  return {
    pp: lower === null || upper === null ? null : withInterval(width),
    ppk: withInterval(above(m, s) < below(m, s) ? above : below),
  };
}
