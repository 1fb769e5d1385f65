import { spreadLimits, type SpreadLaw } from './spread-law';
import { limitSignals, oneOrMany, type StudyChart } from './study-chart';

/**
 * The chart of the spread within each subgroup, judged by its limits alone. A subgroup of one value has no spread
 * and no limits: null.
 */
export function spreadChart(
  name: StudyChart['name'],
  subgroups: readonly (readonly number[])[],
  law: SpreadLaw,
  sigma: number,
  kind: 'classical' | 'probability',
): StudyChart {
  const bySize = new Map<number, ReturnType<typeof spreadLimits>>();
  for (const { length } of subgroups) {
    if (length > 1 && !bySize.has(length)) bySize.set(length, spreadLimits(law, length, sigma, kind));
  }
  const limits = subgroups.map(({ length }) => bySize.get(length) ?? null);
  const points = subgroups.map((values) => law.of(values));
  const lower = limits.map((limit) => limit?.lower ?? null);
  const upper = limits.map((limit) => limit?.upper ?? null);
  return {
    name,
    centre: oneOrMany(limits.map((limit) => limit?.centre ?? null)),
    upper: oneOrMany(upper),
    lower: oneOrMany(lower),
    sigma: oneOrMany(limits.map((limit) => limit?.sigma ?? null)),
    points,
    signals: limitSignals(points, lower, upper),
  };
}
