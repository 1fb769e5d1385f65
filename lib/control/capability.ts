import { andersonDarling } from '@/lib/stats/anderson-darling';
import { mean } from '@/lib/stats/mean';
import { distanceIndexInterval, spreadIndexInterval, targetIndexInterval } from './capability-interval';
import type { Interval } from './limit-interval';
import { percentileCapability } from './percentile-capability';
import { sigmaEstimate, type SigmaEstimate, type SigmaEstimator } from './sigma-estimate';
import { signallingPoints } from './signalling-points';

/** Limits of what is allowed, either of which may be missing, and the target if there is one. */
export interface Specification {
  lower: number | null;
  upper: number | null;
  target: number | null;
}

export interface IndexWithInterval {
  value: number;
  /** 95 %. */
  interval: Interval;
}

/** What a process can hold. Cp and Cpk from σ as named, Pp and Ppk from all values, Cpm about the target. */
export interface Capability {
  values: number;
  mean: number;
  sigma: SigmaEstimate;
  overall: SigmaEstimate;
  cp: IndexWithInterval | null;
  cpk: IndexWithInterval | null;
  pp: IndexWithInterval | null;
  ppk: IndexWithInterval | null;
  cpm: IndexWithInterval | null;
  /** Points that complete a Western Electric pattern; above none the process is not stable and no index foretells. */
  signals: number;
  /** p of the Anderson–Darling test of all values, where the indices take them as normal. */
  normality: number | null;
}

/** Fewer values give no index. */
export const FEWEST_VALUES = 30;

/**
 * The capability of a process against its specification: Cp = (U − L)/6σ, Cpk the nearer limit's distance from the mean
 * over 3σ, Pp and Ppk the same with s of all values, Cpm with √(s² + (x̄ − target)²) (NIST/SEMATECH e-Handbook,
 * section 6.1.6), each with its 95 % interval, which takes the values as independent. With one limit there is no Cp, Pp
 * or Cpm. `lognormal` figures have Pp and Ppk by percentiles alone.
 *
 * Values come in time order, as subgroups (of one value each where there are none). σ of Cp and Cpk is that of
 * `estimator`: of all values unless named. Whether the process is stable is read off the chart of the subgroups' means.
 *
 * `null` below 30 values (common practice, no source) or without spread. Throws `RangeError` without a limit, for limits
 * that are not in order, or a value that is not finite; with `lognormal` for one that is not positive.
 */
export function capability(
  subgroups: readonly (readonly number[])[],
  { lower, upper, target }: Specification,
  options: { estimator?: SigmaEstimator; distribution?: 'normal' | 'lognormal' } = {},
): Capability | null {
  if (lower === null && upper === null) throw new RangeError('name a limit of the specification');
  if (lower !== null && upper !== null && !(lower < upper))
    throw new RangeError('the lower limit is not the lower');
  if ([lower, upper, target].some((limit) => limit !== null && !Number.isFinite(limit)))
    throw new RangeError('a specification is made of finite numbers');
  const values = subgroups.flat();
  const n = values.length;
  if (n < FEWEST_VALUES) return null;
  const centre = mean(values);
  const overall = sigmaEstimate(subgroups, 'overall-s');
  const sigma = sigmaEstimate(subgroups, options.estimator ?? 'overall-s');
  if (!overall || !sigma || overall.sigma === 0 || sigma.sigma === 0) return null;
  const signals = signallingPoints(subgroups.map((group) => mean(group)));
  const common = { values: n, mean: centre, sigma, overall, signals };
  if (options.distribution === 'lognormal') {
    const skewed = percentileCapability(values, { lower, upper });
    return skewed && { ...common, ...skewed, cp: null, cpk: null, cpm: null, normality: null };
  }
  const width = lower === null || upper === null ? null : upper - lower;
  const nearer = Math.min((upper ?? Infinity) - centre, centre - (lower ?? -Infinity));
  const ofWidth = (spread: SigmaEstimate): IndexWithInterval | null =>
    width === null
      ? null
      : {
          value: width / (6 * spread.sigma),
          interval: spreadIndexInterval(width / (6 * spread.s), spread.degreesOfFreedom),
        };
  const ofDistance = ({ sigma: value, s, degreesOfFreedom }: SigmaEstimate): IndexWithInterval => ({
    value: nearer / (3 * value),
    interval: distanceIndexInterval(nearer / (3 * s), n, degreesOfFreedom),
  });
  return {
    ...common,
    cp: ofWidth(sigma),
    cpk: ofDistance(sigma),
    pp: ofWidth(overall),
    ppk: ofDistance(overall),
    cpm:
      width === null || target === null
        ? null
        : aboutTarget(width, n, (centre - target) / overall.s, overall.s),
    normality: andersonDarling(values)?.p ?? null,
  };
}

function aboutTarget(width: number, n: number, distanceInSigma: number, s: number): IndexWithInterval {
  const value = width / (6 * s * Math.hypot(1, distanceInSigma));
  return { value, interval: targetIndexInterval(value, n, distanceInSigma) };
}
