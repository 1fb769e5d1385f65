import { mean } from '@/lib/stats/mean';
import { quantile } from '@/lib/stats/quantile';
import { sampleStandardDeviation } from '@/lib/stats/sample-standard-deviation';
import { chanceLimits, chanceStream, type NormalSource, type StreamShape } from './chance-stream';
import { limitSet, type LimitSet, type SubgroupPoint } from './limit-set';
import type { RuleName } from './rule';
import { ruleWalk, type RuleWalk } from './rule-walk';

/** False cases a point: the mean over baselines with its standard error, and where the middle 80 % of baselines lie. */
export interface FalseCases {
  perPoint: number;
  standardError: number;
  low: number;
  high: number;
}

/** What is simulated: so many baselines, and so many points judged by the limits of each. */
export interface Effort {
  baselines: number;
  points: number;
}

/**
 * False cases of all charts of a stream together: level with its rules, moving range, spread within and between, for
 * a process in control whose levels are independent and normal. Each of many baselines of the size in question sets
 * limits as `limitSet` does, and a long stream is judged by them; so the figure holds for limits that were estimated,
 * and `low` to `high` (10 to 90 % of baselines) says how far it depends on the luck of the baseline.
 *
 * Whatever signals at a point, on one chart or several, is one case; then the rules begin afresh. `baseline: null`
 * stands for limits that are known. The seed is the source's.
 *
 * Throws `RangeError` for a baseline under 2 points, or too little effort: 2 baselines and 100 points at least.
 */
export function falseCases(
  rules: readonly RuleName[],
  shape: StreamShape,
  baseline: number | null,
  source: NormalSource,
  effort: Effort = { baselines: 200, points: 10_000 },
): FalseCases {
  if (!(effort.baselines >= 2 && effort.points >= 100))
    throw new RangeError('2 baselines and 100 points at least');
  if (baseline !== null && !(Number.isInteger(baseline) && baseline >= 2)) {
    throw new RangeError(`no limits from a baseline of ${baseline}`);
  }
  const draw = chanceStream(shape, source);
  const walk = ruleWalk(rules);
  const rates = Array.from({ length: effort.baselines }, () => {
    const limits =
      baseline === null ? chanceLimits(shape) : limitSet(Array.from({ length: baseline }, () => draw()));
    return casesIn(effort.points, limits, walk, draw) / effort.points;
  });
  const perPoint = mean(rates);
  const own = sampleStandardDeviation(rates) ?? 0;
  return {
    perPoint,
    standardError: own / Math.sqrt(rates.length),
    low: quantile(rates, 0.1),
    high: quantile(rates, 0.9),
  };
}

/** How many times a case begins among so many points. */
function casesIn(points: number, limits: LimitSet, walk: RuleWalk, draw: () => SubgroupPoint): number {
  const { level, movingRange, within, between } = limits;
  let cases = 0;
  let before: number | null = null;
  walk.restart();
  for (let i = 0; i < points; i++) {
    const point = draw();
    const range = before === null ? 0 : Math.abs(point.level - before);
    const isOut = (value: number | null, limit: { upper: number; lower?: number } | null): boolean =>
      value !== null && limit !== null && (value > limit.upper || value < (limit.lower ?? -Infinity));
    const levelSignals = walk.signals((point.level - level.centre) / level.sigma);
    before = point.level;
    if (
      levelSignals ||
      range > movingRange.upper ||
      isOut(point.within, within) ||
      isOut(point.between, between)
    ) {
      cases++;
      walk.restart();
      before = null;
    }
  }
  return cases;
}
