import type { ChartPoint } from '@/lib/control/completions-at';
import type { LimitSet } from '@/lib/control/limit-set';

/** Limits around 0 with σ = 1. */
export const unitLimits: LimitSet = {
  n: 100,
  level: { centre: 0, sigma: 1, lower: -3, upper: 3 },
  movingRange: { centre: 1.128, upper: 4.243 },
  within: { logMean: 0, logSigma: 0.2, lower: 0.55, centre: 1, upper: 1.82 },
  between: { centre: 0.8, upper: 2, wafers: 3 },
};

/** One wafer a subgroup at the given levels, in one regime, on limits around 0 with σ = 1. */
export function chartPoints(levels: readonly number[], limits: LimitSet | null = unitLimits): ChartPoint[] {
  return levels.map((level, i) => ({
    level,
    within: null,
    between: null,
    wafers: 1,
    movingRange: i === 0 ? null : Math.abs(level - (levels[i - 1] ?? level)),
    limits,
    regime: 'a',
  }));
}
