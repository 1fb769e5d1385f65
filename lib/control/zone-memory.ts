import type { Rule } from './rule';

/** What one rule must remember of the points before, as one small number, beginning with 0. */
export interface ZoneMemory {
  /** The memory after a point between the lines `low` and `high`, or null where the point completes the pattern. */
  after(memory: number, low: number, high: number): number | null;
}

/**
 * The memories of one rule: one for each half of the chart, or one for both. Bits of points that can no longer
 * help to complete a pattern are forgotten, after C. W. Champ and W. H. Woodall, Technometrics 29, 393 (1987), so
 * that few memories are left.
 *
 * Throws `RangeError` for a trend or an alternation, which zones do not decide: their run length is simulated.
 */
export function zoneMemories(rule: Rule): ZoneMemory[] {
  switch (rule.kind) {
    case 'limit':
      return [register(1, 1, (low, high) => low >= 3 || high <= -3)];
    case 'zone': {
      const { need, of, sigma } = rule;
      return [register(need, of, (low) => low >= sigma), register(need, of, (_, high) => high <= -sigma)];
    }
    case 'within':
      return [register(rule.of, rule.of, (low, high) => low >= -rule.sigma && high <= rule.sigma)];
    case 'mixture':
      return [mixture(rule.of, rule.sigma)];
    default:
      throw new RangeError(`the run length of ${rule.name} is not a matter of zones: simulate it`);
  }
}

/** The sigma of every line that the rule needs drawn, on one side. */
export function zoneLine(rule: Rule): number {
  return rule.kind === 'limit' ? 3 : 'sigma' in rule ? rule.sigma : 0;
}

/** Bits of the last `of` − 1 points, the newest lowest: 1 where the point counts. */
function register(need: number, of: number, counts: (low: number, high: number) => boolean): ZoneMemory {
  const kept = (1 << (of - 1)) - 1;
  return {
    after(memory, low, high) {
      const window = (memory << 1) | (counts(low, high) ? 1 : 0);
      if ((window & 1) === 1 && ones(window) >= need) return null;
      return trimmed(window & kept, need, of);
    },
  };
}

/** Without the oldest points that cannot take part in a pattern even if all that follow count. */
function trimmed(memory: number, need: number, of: number): number {
  let left = memory;
  while (left !== 0) {
    const age = 32 - Math.clz32(left);
    if (ones(left) + of - age >= need) return left;
    left &= ~(1 << (age - 1));
  }
  return 0;
}

/** `of` in a row beyond the line on either side, both sides among them: run, run of the last side, last side. */
function mixture(of: number, sigma: number): ZoneMemory {
  return {
    after(memory, low, high) {
      const above = low >= sigma;
      if (!above && !(high <= -sigma)) return 0;
      const [run, sameRun, wasAbove] = [memory & 31, (memory >> 5) & 31, memory >> 10 === 1];
      const nextSame = run > 0 && wasAbove === above ? sameRun + 1 : 1;
      if (run + 1 >= of && nextSame < of) return null;
      const cap = of - 1;
      return Math.min(run + 1, cap) | (Math.min(nextSame, cap) << 5) | (above ? 1 << 10 : 0);
    },
  };
}

function ones(bits: number): number {
  let count = 0;
  for (let left = bits; left !== 0; left &= left - 1) count++;
  return count;
}
