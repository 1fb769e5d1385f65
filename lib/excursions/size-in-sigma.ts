import type { LimitSet } from '@/lib/control/limit-set';
import type { ChartedFigures } from './types';

/**
 * How far a subgroup stands from the centre of one chart, in σ, so that cases of different charts can be ranked.
 *
 * Level (and out of specification): |level − centre|/σ. Within: the same of the logarithm, as its limits are lognormal.
 * Moving range and between: the upper limit counts as 3 σ, as it is crossed as seldom (0.27 %). Null where the
 * figure or the limits are not there.
 *
 * @example sizeInSigma('level', { level: 13, … }, limits 10 ± 3) // 3
 */
export function sizeInSigma(chart: string, figures: ChartedFigures, limits: LimitSet | null): number | null {
  if (limits === null) return null;
  const { level, movingRange, within, between } = figures;
  switch (chart) {
    case 'moving-range':
      return ofUpper(movingRange, limits.movingRange.upper);
    case 'between':
      return ofUpper(between, limits.between?.upper ?? null);
    case 'within': {
      if (within === null || within <= 0 || limits.within === null) return null;
      const { logMean, logSigma } = limits.within;
      return logSigma > 0 ? Math.abs(Math.log(within) - logMean) / logSigma : null;
    }
    default:
      return level === null ? null : Math.abs(level - limits.level.centre) / limits.level.sigma;
  }
}

function ofUpper(value: number | null, upper: number | null): number | null {
  return value === null || upper === null || upper <= 0 ? null : (3 * value) / upper;
}
