import { parseRule, type RuleName } from './rule';
import { zoneLine, zoneMemories } from './zone-memory';

/** A set of rules as a machine: which state follows which, by the zone of the chart a point falls into. */
export interface RuleAutomaton {
  /** Zone lines in σ from the centre, ascending; zone z lies below line z, the last above all. */
  lines: readonly number[];
  /** `next[state · zones + zone]`: the state that follows, or −1 where the point completes a pattern. State 0 begins. */
  next: Int32Array;
  states: number;
}

/** More states than any sensible set of rules has: beyond them exact run lengths cost too much. */
const MOST_STATES = 1500;

/**
 * The smallest machine that signals exactly when one of the rules does. All memories of all rules that can occur
 * together are followed from the beginning; states that no future point can tell apart are merged (E. F. Moore,
 * Automata Studies, Princeton 1956). For the four Western Electric rules that leaves
 * 215 states.
 *
 * Points fall on no line, as continuous values do. Throws `RangeError` for no rule at all, an unknown one, a trend
 * or alternation, and a set with too many states.
 *
 * @example ruleAutomaton(['beyond-3-sigma']).states // 1
 */
export function ruleAutomaton(names: readonly RuleName[]): RuleAutomaton {
  if (names.length === 0) throw new RangeError('no rule, no run length');
  const rules = names.map(parseRule);
  const memories = rules.flatMap(zoneMemories);
  const lines = [...new Set(rules.flatMap((rule) => [zoneLine(rule), -zoneLine(rule) + 0]))].sort(
    (a, b) => a - b,
  );
  const zones = lines.length + 1;
  const places = new Map<string, number>();
  const found: number[][] = [];
  const placeOf = (state: number[]): number => {
    const key = state.join();
    const place = places.get(key) ?? found.length;
    if (place === found.length) {
      places.set(key, place);
      found.push(state);
      if (found.length > 20 * MOST_STATES) throw new RangeError('these rules together have too many states');
    }
    return place;
  };
  placeOf(memories.map(() => 0));
  const next: number[] = [];
  for (let place = 0; place < found.length; place++) {
    const state = found[place] ?? [];
    for (let zone = 0; zone < zones; zone++) {
      const [low, high] = [lines[zone - 1] ?? -Infinity, lines[zone] ?? Infinity];
      const after: number[] = [];
      for (let i = 0; i < memories.length; i++) {
        const memory = memories[i]?.after(state[i] ?? 0, low, high) ?? null;
        if (memory === null) break;
        after.push(memory);
      }
      next.push(after.length < memories.length ? -1 : placeOf(after));
    }
  }
  return { lines, ...merged(Int32Array.from(next), zones) };
}

/** The same machine with states merged that no sequence of points tells apart; the first stays state 0. */
function merged(next: Int32Array, zones: number): { next: Int32Array; states: number } {
  const size = next.length / zones;
  let classes = new Int32Array(size);
  let count = 1;
  for (;;) {
    const known = new Map<string, number>();
    const finer = new Int32Array(size);
    for (let state = 0; state < size; state++) {
      let key = String(classes[state]);
      for (let zone = 0; zone < zones; zone++) {
        const to = next[state * zones + zone] ?? -1;
        key += `,${to < 0 ? -1 : (classes[to] ?? 0)}`;
      }
      const place = known.get(key) ?? known.size;
      if (place === known.size) known.set(key, place);
      finer[state] = place;
    }
    classes = finer;
    if (known.size === count) break;
    count = known.size;
  }
  if (count > MOST_STATES) throw new RangeError('these rules together have too many states');
  const table = new Int32Array(count * zones);
  for (let state = 0; state < size; state++) {
    for (let zone = 0; zone < zones; zone++) {
      const to = next[state * zones + zone] ?? -1;
      table[(classes[state] ?? 0) * zones + zone] = to < 0 ? -1 : (classes[to] ?? 0);
    }
  }
  return { next: table, states: count };
}
