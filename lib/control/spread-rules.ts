import type { ChartPoint } from './completions-at';
import { patternAt } from './pattern-at';
import { LOOK_BACK, parseRule, type RuleName } from './rule';
import type { StudySignal } from './study-chart';

/**
 * What the Western Electric handbook (1956) gives for the range chart of small subgroups, whose lower half is
 * squeezed against zero: other counts above than below (from memory). Each name counts on its own half only.
 */
export const SMALL_SUBGROUP_RULES: { above: readonly RuleName[]; below: readonly RuleName[] } = {
  above: ['2-of-2-beyond-2-sigma', '3-of-3-beyond-1-sigma', '7-of-7-beyond-0-sigma'],
  below: ['4-of-4-beyond-2-sigma', '6-of-6-beyond-1-sigma', '10-of-10-beyond-0-sigma'],
};

/** From this size of subgroup on the handbook lets a range chart have the rules of the level chart. */
export const LARGE_SUBGROUP = 5;

/**
 * Whether a chart of ranges or standard deviations may have a rule beside its limits, and if not why. Subgroups of
 * five and more take the four rules of the level chart; smaller ones what `SMALL_SUBGROUP_RULES` holds. Stratification,
 * mixture, trend and alternation ask for a symmetric chart and are refused on either.
 *
 * Throws `RangeError` for an unknown rule.
 */
export function spreadRuleFault(name: RuleName, smallestSubgroup: number): string | null {
  const { kind } = parseRule(name);
  if (kind === 'limit') return null;
  if (kind !== 'zone') return `${name} asks for a symmetric chart; a spread has none`;
  if (smallestSubgroup >= LARGE_SUBGROUP) return null;
  const { above, below } = SMALL_SUBGROUP_RULES;
  if ([...above, ...below].includes(name)) return null;
  return `${name} is not for the spread of fewer than ${LARGE_SUBGROUP} values; the handbook allows ${above.join(', ')} above and ${below.join(', ')} below the centre`;
}

/**
 * Signals of a chart of ranges or standard deviations by rules beside its limits: `points` each with the limits of
 * its own size as level limits. Throws `RangeError` with the reason for a rule the chart may not have.
 */
export function spreadRuleSignals(
  points: readonly ChartPoint[],
  rules: readonly RuleName[],
  smallestSubgroup: number,
): StudySignal[] {
  const asked = rules.filter((name) => parseRule(name).kind !== 'limit');
  for (const name of asked) {
    const fault = spreadRuleFault(name, smallestSubgroup);
    if (fault !== null) throw new RangeError(fault);
  }
  const isOneHalf = smallestSubgroup < LARGE_SUBGROUP;
  return points.flatMap((_, index) =>
    asked.flatMap((rule): StudySignal[] => {
      const pattern = patternAt(points, startOf(points, index), index, parseRule(rule));
      if (!pattern || (isOneHalf && !SMALL_SUBGROUP_RULES[pattern.side].includes(rule))) return [];
      const participants = pattern.participants.map((i) => i + 1);
      return [{ point: index + 1, rule, side: pattern.side, participants }];
    }),
  );
}

/** The first point, as far as rules look, after the last one without limits. */
function startOf(points: readonly ChartPoint[], index: number): number {
  let start = index;
  while (start > 0 && index - start < LOOK_BACK && points[start - 1]?.limits) start--;
  return start;
}
