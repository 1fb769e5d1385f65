import { cusumRunLength, type CusumDesign } from './cusum-run-length';
import { ewmaRunLength, type EwmaDesign } from './ewma-run-length';
import type { RuleName } from './rule';
import { ruleAutomaton } from './rule-automaton';
import { ruleRunLength, type RunLengthOptions } from './rule-run-length';

/** A chart of levels as far as its run length goes. */
export type ChartDesign =
  | { kind: 'rules'; rules: readonly RuleName[] }
  | ({ kind: 'ewma' } & EwmaDesign)
  | ({ kind: 'cusum' } & CusumDesign);

/**
 * The average run length of a chart judged by rules, an EWMA or a CUSUM: mean points to the first signal, that point
 * included. See `ruleRunLength`, `ewmaRunLength` and `cusumRunLength`, which throw `RangeError` for what they do not
 * take.
 */
export function chartRunLength(design: ChartDesign, options: RunLengthOptions = {}): number {
  return runLengthsOf(design)(options);
}

/** `chartRunLength` of one chart for many shifts: what does not depend on them is made once. */
export function runLengthsOf(design: ChartDesign): (options: RunLengthOptions) => number {
  switch (design.kind) {
    case 'rules': {
      const automaton = ruleAutomaton(design.rules);
      return (options) => ruleRunLength(automaton, options);
    }
    case 'ewma':
      return (options) => ewmaRunLength(design, options);
    case 'cusum':
      return (options) => cusumRunLength(design, options);
  }
}
