import { monotoneRoot } from '@/lib/physics/monotone-root';
import type { RuleName } from './rule';
import { ruleAutomaton } from './rule-automaton';
import { ruleRunLength } from './rule-run-length';

/** A level chart with its rules and how many points a week it gets. */
export interface BusyChart {
  rules: readonly RuleName[];
  pointsPerWeek: number;
}

/** False signals a week of several charts together, each begun afresh after its signal. σ is taken as known. */
export function falseSignalsPerWeek(charts: readonly BusyChart[], widening = 1): number {
  return weekly(charts)(widening);
}

/**
 * By what factor all lines of all charts, zone lines too, must lie further out so that the level charts of a board
 * together give no more than the budgeted false signals a week. 1 where they give no more as they are. σ is taken as
 * known, values as independent and normal: what estimated limits add, `falseCases` tells.
 *
 * Null where even lines almost three times as far out do not do, as with eight on one side, which no widening quiets.
 * Throws `RangeError` for a budget that is not positive or points a week that are negative.
 */
export function wideningFor(charts: readonly BusyChart[], budgetPerWeek: number): number | null {
  if (!(budgetPerWeek > 0 && Number.isFinite(budgetPerWeek)))
    throw new RangeError(`no budget of ${budgetPerWeek}`);
  const rate = weekly(charts);
  if (rate(1) <= budgetPerWeek) return 1;
  const excess = (widening: number): number => Math.log(rate(widening) / budgetPerWeek);
  let high = 1.25;
  while (excess(high) > 0 && high < 2.5) high *= 1.25;
  return monotoneRoot(excess, high / 1.25, high, 1e-6);
}

function weekly(charts: readonly BusyChart[]): (widening: number) => number {
  const points = new Map<string, { rules: readonly RuleName[]; perWeek: number }>();
  for (const { rules, pointsPerWeek } of charts) {
    if (!(pointsPerWeek >= 0 && Number.isFinite(pointsPerWeek)))
      throw new RangeError(`no ${pointsPerWeek} points a week`);
    const key = [...rules].sort().join();
    points.set(key, { rules, perWeek: (points.get(key)?.perWeek ?? 0) + pointsPerWeek });
  }
  const kinds = [...points.values()].map(({ rules, perWeek }) => ({
    machine: ruleAutomaton(rules),
    perWeek,
  }));
  return (widening) =>
    kinds.reduce(
      (sum, { machine, perWeek }) => sum + perWeek / ruleRunLength(machine, { spread: 1 / widening }),
      0,
    );
}
