import { parseRule, type RuleName } from './rule';
import { ruleAutomaton } from './rule-automaton';

/** A chart walked point by point, as simulations do: `signals` takes the next value in σ from the centre. */
export interface RuleWalk {
  signals(z: number): boolean;
  /** Begins the rules afresh. */
  restart(): void;
}

/**
 * The rules of a level chart as a machine that takes one value after another, a hundred times as fast as
 * `completionsAt` and of the same opinion up to the first signal (but for a value exactly on a line, which continuous
 * values never are). After a signal it is to be restarted.
 *
 * Throws `RangeError` for no rule at all, an unknown one, or a set with too many states.
 */
export function ruleWalk(names: readonly RuleName[]): RuleWalk {
  const rules = names.map(parseRule);
  const isZone = ({ kind }: { kind: string }) => kind !== 'trend' && kind !== 'alternating';
  const zoneNames = rules.filter(isZone).map(({ name }) => name);
  const longestOf = (kind: string) =>
    rules.reduce((least, rule) => (rule.kind === kind ? Math.min(least, rule.of) : least), Infinity);
  const [trend, alternation] = [longestOf('trend'), longestOf('alternating')];
  const watchesSteps = trend < Infinity || alternation < Infinity;
  if (rules.length === 0) throw new RangeError('no rule, no signal');
  const { lines, next } = zoneNames.length > 0 ? ruleAutomaton(zoneNames) : NO_ZONES;
  let state = 0;
  let before: number | null = null;
  let direction = 0;
  let rising = 1;
  let turning = 1;
  const restart = (): void => {
    state = 0;
    before = null;
    direction = 0;
  };
  /** Counts points that rise or fall steadily, and those that turn at every step. */
  const stepped = (z: number): boolean => {
    const step = before === null ? 0 : Math.sign(z - before);
    before = z;
    rising = step === 0 ? 1 : step === direction ? rising + 1 : 2;
    turning = step === 0 ? 1 : step === -direction ? turning + 1 : 2;
    direction = step;
    return rising >= trend || turning >= alternation;
  };
  return {
    restart,
    signals(z) {
      let zone = 0;
      while (zone < lines.length && z > (lines[zone] ?? Infinity)) zone++;
      const to = next[state * (lines.length + 1) + zone] ?? -1;
      const stepSignals = watchesSteps && stepped(z);
      state = Math.max(0, to);
      return to < 0 || stepSignals;
    },
  };
}

const NO_ZONES = { lines: [] as readonly number[], next: Int32Array.of(0) };
