import { c4 } from '@/lib/stats/c4';
import type { LimitSet, SubgroupPoint } from './limit-set';
import { MEAN_RANGE_OF_TWO, MOVING_RANGE_PROBABILITY } from './moving-range-factors';
import { standardDeviationLaw } from './spread-law';
import { standardNormalCdf } from '@/lib/stats/standard-normal';

/** Where normal values come from: seeded, so that the same seed gives the same stream. */
export interface NormalSource {
  normal(): number;
}

/** Which charts a stream has beside level and moving range: the spread within, and between so many wafers a subgroup. */
export interface StreamShape {
  within: boolean;
  wafers: number;
}

/** How far the logarithm of the spread within varies in a stream of chance; no rate depends on it. */
const LOG_SIGMA = 0.2;

/**
 * Subgroups of a process in control, one a call: levels normal around 0 with σ 1, spreads within lognormal, spreads
 * between those of normal wafers with σ 1; all independent.
 *
 * Throws `RangeError` unless the wafers are a whole number from 1 up.
 */
export function chanceStream({ within, wafers }: StreamShape, source: NormalSource): () => SubgroupPoint {
  if (!Number.isInteger(wafers) || wafers < 1) throw new RangeError(`no subgroup of ${wafers} wafers`);
  return () => {
    const level = source.normal();
    const spread = within ? Math.exp(LOG_SIGMA * source.normal()) : null;
    let squares = 0;
    for (let wafer = 1; wafer < wafers; wafer++) squares += source.normal() ** 2;
    const between = wafers > 1 ? Math.sqrt(squares / (wafers - 1)) : null;
    return { level, within: spread, between, wafers };
  };
}

/** The limits of that stream as if its σ were known. */
export function chanceLimits({ within, wafers }: StreamShape): LimitSet {
  const inside = 1 - 2 * standardNormalCdf(-3);
  const width = Math.exp(3 * LOG_SIGMA);
  return {
    n: 0,
    level: { centre: 0, sigma: 1, lower: -3, upper: 3 },
    movingRange: { centre: MEAN_RANGE_OF_TWO, upper: MOVING_RANGE_PROBABILITY * MEAN_RANGE_OF_TWO },
    within: within ? { logMean: 0, logSigma: LOG_SIGMA, lower: 1 / width, centre: 1, upper: width } : null,
    between:
      wafers > 1
        ? { centre: c4(wafers), upper: standardDeviationLaw.quantile(inside, wafers), wafers }
        : null,
  };
}
