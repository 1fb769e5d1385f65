import { normalBetween } from './normal-between';
import { absorbingChain, type AbsorbingChain } from './absorbing-chain';
import type { RuleName } from './rule';
import { ruleAutomaton, type RuleAutomaton } from './rule-automaton';

/**
 * How a chart stands when the shift comes: `zero`, the rules just begun, or `steady`, long in use without a signal.
 */
export type StartState = 'zero' | 'steady';

/** `shift` of the mean and `spread` of the values, both in the σ that the limits were drawn with. */
export interface RunLengthOptions {
  shift?: number;
  spread?: number;
  start?: StartState;
}

/**
 * The average run length of a chart judged by rules: the mean number of points to the first signal, that point
 * included, for independent normal values. Exact, by the Markov chain of C. W. Champ and W. H. Woodall,
 * Technometrics 29, 393 (1987), but for the last digits of the arithmetic.
 *
 * `start: 'steady'` is for a shift that comes after the chart ran long in control without a signal: the state then
 * has the distribution conditional on that. Rules are those that zones decide; a trend or alternation is simulated
 * (`simulatedRunLength`). `rules` may be an automaton, made once for many shifts.
 *
 * Throws `RangeError` for a shift or spread that is not finite, a spread that is not positive, and for what
 * `ruleAutomaton` refuses.
 *
 * @example ruleRunLength(['beyond-3-sigma']) // 370.398
 */
export function ruleRunLength(
  rules: readonly RuleName[] | RuleAutomaton,
  { shift = 0, spread = 1, start = 'zero' }: RunLengthOptions = {},
): number {
  const automaton = 'next' in rules ? rules : ruleAutomaton(rules);
  const steps = chainOf(automaton, shift, spread).steps();
  if (start === 'zero') return steps[automaton.states - 1] ?? 0;
  const standing = chainOf(automaton, 0, spread).standing();
  return standing.reduce((sum, share, state) => sum + share * (steps[state] ?? 0), 0);
}

/** The chain with its states from last to first: those seldom reached go first, which leaves it almost empty. */
function chainOf({ lines, next, states }: RuleAutomaton, shift: number, spread: number): AbsorbingChain {
  if (!Number.isFinite(shift)) throw new RangeError(`no shift of ${shift} σ`);
  if (!(spread > 0 && Number.isFinite(spread))) throw new RangeError(`no spread of ${spread} σ`);
  const zones = lines.length + 1;
  const chances = Float64Array.from({ length: zones }, (_, zone) =>
    normalBetween(
      ((lines[zone - 1] ?? -Infinity) - shift) / spread,
      ((lines[zone] ?? Infinity) - shift) / spread,
    ),
  );
  const kept = new Float64Array(states * states);
  for (let state = 0; state < states; state++) {
    for (let zone = 0; zone < zones; zone++) {
      const to = next[state * zones + zone] ?? -1;
      if (to < 0) continue;
      const place = (states - 1 - state) * states + states - 1 - to;
      kept[place] = (kept[place] ?? 0) + (chances[zone] ?? 0);
    }
  }
  return absorbingChain(kept, states);
}
