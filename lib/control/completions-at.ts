import { betweenLimitsFor } from './between-limits';
import type { LimitSet, SubgroupPoint } from './limit-set';
import { isBeyond } from './is-beyond';
import { patternAt, type Pattern } from './pattern-at';
import { LOOK_BACK, parseRule, WESTERN_ELECTRIC, type RuleName } from './rule';

export { LOOK_BACK } from './rule';

/**
 * A subgroup with the limits it is judged by. `movingRange` is its distance from the subgroup before, null where
 * there is none. `regime` changes with a revision of the limits or a restart: no rule looks across.
 */
export interface ChartPoint extends SubgroupPoint {
  movingRange: number | null;
  limits: LimitSet | null;
  regime: string;
}

export type ChartName = 'level' | 'moving-range' | 'within' | 'between';

/**
 * A pattern that the point at `index` completes; `participants` are the points that took part, itself last.
 * `sameRegimeBefore` counts the points before it that share its regime, as far as any rule looks.
 */
export interface Completion {
  index: number;
  chart: ChartName;
  rule: RuleName;
  side: 'above' | 'below';
  participants: number[];
  sameRegimeBefore?: number;
}

/**
 * The patterns that the point at `index` completes, on all charts. Western Electric semantics: each half of a chart
 * is judged by itself, the completing point takes part, and a point exactly on a line is not beyond it. `rules`
 * judge the level; moving range, within and between are judged by their limits alone (`beyond-limit`), the moving
 * range not at the first point of a regime. A point without limits completes nothing and ends every pattern.
 *
 * The answer depends on the points from `index − LOOK_BACK` to `index` and on nothing else.
 *
 * Throws `RangeError` when there is no such point, a rule is unknown, or a level it looks at is not finite.
 */
export function completionsAt(
  points: readonly ChartPoint[],
  index: number,
  rules: readonly RuleName[] = WESTERN_ELECTRIC,
): Completion[] {
  const point = points[index];
  if (!point) throw new RangeError(`there is no point ${index} among ${points.length}`);
  const { limits } = point;
  if (!limits) return [];
  const start = regimeStart(points, index, point.regime);
  const found: Completion[] = [];
  const add = (chart: ChartName, rule: RuleName, { side, participants }: Pattern) =>
    found.push({ index, chart, rule, side, participants, sameRegimeBefore: index - start });
  for (const name of rules) {
    const pattern = patternAt(points, start, index, parseRule(name));
    if (pattern) add('level', name, pattern);
  }
  const judge = (chart: ChartName, value: number | null, lower: number | null, upper: number) => {
    if (value === null) return;
    if (!Number.isFinite(value)) throw new RangeError(`point ${index} has no finite ${chart} value`);
    if (isBeyond(value, upper, 'above')) add(chart, 'beyond-limit', { side: 'above', participants: [index] });
    else if (lower !== null && isBeyond(value, lower, 'below')) {
      add(chart, 'beyond-limit', { side: 'below', participants: [index] });
    }
  };
  if (start < index) judge('moving-range', point.movingRange, null, limits.movingRange.upper);
  if (limits.within) judge('within', point.within, limits.within.lower, limits.within.upper);
  if (limits.between && point.between !== null && point.wafers >= 2) {
    judge('between', point.between, null, betweenLimitsFor(limits.between, point.wafers).upper);
  }
  return found;
}

/** The first point, as far as rules look, from which on all points share the regime and have limits. */
function regimeStart(points: readonly ChartPoint[], index: number, regime: string): number {
  let start = index;
  while (start > 0 && index - start < LOOK_BACK) {
    const earlier = points[start - 1];
    if (!earlier || earlier.regime !== regime || !earlier.limits) break;
    start--;
  }
  return start;
}
