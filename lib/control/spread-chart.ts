import type { ChartPoint } from './completions-at';
import type { RuleName } from './rule';
import { spreadLimits, type SpreadLaw } from './spread-law';
import { spreadRuleSignals } from './spread-rules';
import { limitSignals, oneOrMany, type SigmaSource, type StudyChart } from './study-chart';

/**
 * The chart of the spread within each subgroup, judged by its limits, and by the rules its subgroups are large
 * enough for (`spreadRuleFault`). A subgroup of one value has no spread and no limits: null.
 *
 * Throws `RangeError` with the reason for a rule that such a chart may not have.
 */
export function spreadChart(
  name: StudyChart['name'],
  subgroups: readonly (readonly number[])[],
  law: SpreadLaw,
  { sigma, estimator }: { sigma: number; estimator: SigmaSource },
  {
    limits: kind,
    spreadRules = [],
  }: { limits: 'classical' | 'probability'; spreadRules?: readonly RuleName[] },
): StudyChart {
  const bySize = new Map<number, ReturnType<typeof spreadLimits>>();
  for (const { length } of subgroups) {
    if (length > 1 && !bySize.has(length)) bySize.set(length, spreadLimits(law, length, sigma, kind));
  }
  const limits = subgroups.map(({ length }) => bySize.get(length) ?? null);
  const points = subgroups.map((values) => law.of(values));
  const lower = limits.map((limit) => limit?.lower ?? null);
  const upper = limits.map((limit) => limit?.upper ?? null);
  const charted = points.map((value, i): ChartPoint => {
    const limit = limits[i];
    return { ...BARE, level: value ?? 0, limits: limit ? { ...NO_LIMITS, level: limit } : null };
  });
  const smallest = subgroups.reduce(
    (least, { length }) => (length > 1 ? Math.min(least, length) : least),
    Infinity,
  );
  const ruleSignals = spreadRuleSignals(charted, spreadRules, smallest);
  return {
    name,
    estimator,
    centre: oneOrMany(limits.map((limit) => limit?.centre ?? null)),
    upper: oneOrMany(upper),
    lower: oneOrMany(lower),
    sigma: oneOrMany(limits.map((limit) => limit?.sigma ?? null)),
    points,
    signals: [...limitSignals(points, lower, upper), ...ruleSignals].sort((a, b) => a.point - b.point),
  };
}

const BARE = { within: null, between: null, wafers: 1, movingRange: null, regime: 'study' };
const NO_LIMITS = { n: 0, movingRange: { centre: 0, upper: 0 }, within: null, between: null };
