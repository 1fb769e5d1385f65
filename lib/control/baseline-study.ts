import { andersonDarling, type AndersonDarling } from '@/lib/stats/anderson-darling';
import { c4 } from '@/lib/stats/c4';
import { lagOneAutocorrelation, lagOneLowerBound } from '@/lib/stats/lag-one-autocorrelation';
import { ljungBox } from '@/lib/stats/ljung-box';
import { sampleStandardDeviation } from '@/lib/stats/sample-standard-deviation';
import { isBeyond } from './is-beyond';
import { limitAge, limitSet, type LimitAge, type LimitSet, type SubgroupPoint } from './limit-set';

/** Above this lower bound of the lag-one autocorrelation limits from moving ranges are not to be trusted. */
export const MEMORY_ALLOWED = 0.1;

/** How far each level foretells the next. */
export interface Memory {
  lagOne: number;
  /** 95 % lower bound of the true lag-one autocorrelation. */
  lowerBound: number;
  ljungBox: { statistic: number; lags: number; p: number } | null;
}

/** What a span of subgroups says of the limits it would give. */
export interface BaselineStudy {
  limits: LimitSet;
  age: LimitAge;
  /** Places, counted from 0, of subgroups beyond the candidate limits of the level. */
  beyond: number[];
  normality: AndersonDarling | null;
  memory: Memory | null;
  /** Whether limits from moving ranges stand: the lower bound of lag one is at most 0.1. */
  movingRangesStand: boolean;
  /** Level limits from the s of all levels over c4, which memory does not narrow. */
  longRun: { sigma: number; lower: number; upper: number } | null;
  /** First-order autoregression: next level − centre = φ·(level − centre) + residual, and the σ of the residuals. */
  autoregression: { phi: number; sigma: number } | null;
}

/**
 * Whether a span of subgroups can carry control limits, and which: candidate limits as `limitSet` gives them, points
 * beyond them, normality (Anderson–Darling), memory (lag one, Ljung–Box), and what to take where moving ranges would
 * give limits too narrow because each level follows the one before: limits from the long-run s, or a chart of the
 * residuals of a first-order autoregression (L. C. Alwan and H. V. Roberts, J. Business and Economic Statistics 6, 87
 * (1988)), its φ freed of the bias (1 + 4φ)/n (F. H. C. Marriott and J. A. Pope, Biometrika 41, 390 (1954)).
 *
 * What needs more subgroups, or levels that differ, is null. Throws `RangeError` as `limitSet` does.
 */
export function baselineStudy(baseline: readonly SubgroupPoint[]): BaselineStudy {
  const limits = limitSet(baseline);
  const levels = baseline.map(({ level }) => level);
  const n = levels.length;
  const { lower, centre, upper } = limits.level;
  const s = sampleStandardDeviation(levels);
  const memory = n < 8 ? null : memoryOf(levels);
  const sigma = s === null || s === 0 ? null : s / c4(n);
  const phi = memory && Math.max(-0.99, Math.min(0.99, (n * memory.lagOne + 1) / (n - 4)));
  return {
    limits,
    age: limitAge(n),
    beyond: levels.flatMap((level, i) =>
      isBeyond(level, upper, 'above') || isBeyond(level, lower, 'below') ? [i] : [],
    ),
    normality: andersonDarling(levels),
    memory,
    movingRangesStand: memory === null || memory.lowerBound <= MEMORY_ALLOWED,
    longRun: sigma === null ? null : { sigma, lower: centre - 3 * sigma, upper: centre + 3 * sigma },
    autoregression: phi === null || sigma === null ? null : { phi, sigma: sigma * Math.sqrt(1 - phi * phi) },
  };
}

function memoryOf(levels: readonly number[]): Memory | null {
  const lagOne = lagOneAutocorrelation(levels);
  if (lagOne === null) return null;
  return { lagOne, lowerBound: lagOneLowerBound(lagOne, levels.length), ljungBox: ljungBox(levels) };
}
