import type { ChartName } from './completions-at';

/**
 * Rules of control charts, named in words. The four of Western Electric, the two further patterns of that handbook
 * (Statistical Quality Control Handbook, Western Electric, 1956), the two counts of L. S. Nelson (J. Quality
 * Technology 16, 237 (1984)), any `M-of-N-beyond-K-sigma`, and `beyond-limit`, which judges a chart by its drawn
 * limits alone.
 */
export type RuleName =
  | 'beyond-3-sigma'
  | 'two-of-three-beyond-2-sigma'
  | 'four-of-five-beyond-1-sigma'
  | 'eight-on-one-side'
  | 'fifteen-within-1-sigma'
  | 'eight-beyond-1-sigma'
  | 'six-in-a-trend'
  | 'fourteen-alternating'
  | (string & {});

/**
 * What a rule asks of the points up to the judged one. `zone`: `need` of the last `of` points beyond `sigma` on the
 * same side. `limit`: beyond the drawn limit. `within`, `mixture`: `of` in a row inside, or outside on both sides,
 * of `sigma`. `trend`, `alternating`: `of` points that rise or fall steadily, or turn at every step.
 */
export type Rule =
  | { name: RuleName; kind: 'zone'; need: number; of: number; sigma: number }
  | { name: RuleName; kind: 'limit'; of: 1 }
  | { name: RuleName; kind: 'within' | 'mixture'; of: number; sigma: number }
  | { name: RuleName; kind: 'trend' | 'alternating'; of: number };

/** The most points any supported rule looks back beyond the judged one. */
export const LOOK_BACK = 14;

/** The four Western Electric rules of instability, the default on a level chart. */
export const WESTERN_ELECTRIC: readonly RuleName[] = [
  'beyond-3-sigma',
  'two-of-three-beyond-2-sigma',
  'four-of-five-beyond-1-sigma',
  'eight-on-one-side',
];

const NAMED: readonly Rule[] = [
  { name: 'beyond-limit', kind: 'limit', of: 1 },
  { name: 'beyond-3-sigma', kind: 'limit', of: 1 },
  { name: 'two-of-three-beyond-2-sigma', kind: 'zone', need: 2, of: 3, sigma: 2 },
  { name: 'four-of-five-beyond-1-sigma', kind: 'zone', need: 4, of: 5, sigma: 1 },
  { name: 'eight-on-one-side', kind: 'zone', need: 8, of: 8, sigma: 0 },
  { name: 'fifteen-within-1-sigma', kind: 'within', of: 15, sigma: 1 },
  { name: 'eight-beyond-1-sigma', kind: 'mixture', of: 8, sigma: 1 },
  { name: 'six-in-a-trend', kind: 'trend', of: 6 },
  { name: 'fourteen-alternating', kind: 'alternating', of: 14 },
];

const known = new Map<string, Rule>(NAMED.map((rule) => [rule.name, rule]));

/**
 * The rule behind a name. `beyond-3-sigma` is judged by the drawn limits, which lie three σ from the centre unless
 * someone entered others.
 *
 * Throws `RangeError` for an unknown name, and for an `M-of-N-beyond-K-sigma` unless 1 ≤ M ≤ N ≤ 15.
 *
 * @example parseRule('3-of-4-beyond-1.5-sigma') // { kind: 'zone', need: 3, of: 4, sigma: 1.5, … }
 */
export function parseRule(name: string): Rule {
  const rule = known.get(name);
  if (rule) return rule;
  const match = /^(\d{1,2})-of-(\d{1,2})-beyond-(\d{1,2}(?:\.\d{1,6})?)-sigma$/.exec(name);
  if (!match) throw new RangeError(`no rule is called "${name}"`);
  const [need, of, sigma] = [Number(match[1]), Number(match[2]), Number(match[3])];
  if (need < 1 || need > of || of > LOOK_BACK + 1) {
    throw new RangeError(`"${name}" needs 1 ≤ M ≤ N ≤ ${LOOK_BACK + 1}`);
  }
  return { name, kind: 'zone', need, of, sigma };
}

/** Whether a completion of the rule belongs to one half of the chart, so that the other half's is another matter. */
export function isOneSided(name: RuleName): boolean {
  const { kind } = parseRule(name);
  return kind === 'zone' || kind === 'limit' || kind === 'trend';
}

/**
 * The family of a rule: `instability` for points too far out or too long on one side, `pattern` for other
 * unnatural sequences, after the two groups of the Western Electric handbook.
 */
export function ruleFamily(name: RuleName): 'instability' | 'pattern' {
  const { kind } = parseRule(name);
  return kind === 'zone' || kind === 'limit' ? 'instability' : 'pattern';
}

/**
 * A signal in plain words, such as "8 in a row below the centre line". `count` is how many points took part; a
 * smaller number than the rule needs reads as the number it needs. `chart` matters only for limits: too little
 * spread within a subgroup is not good news, it is suspicious.
 *
 * Throws `RangeError` for an unknown rule.
 *
 * @example ruleSentence('eight-on-one-side', 'below', 8) // '8 in a row below the centre line'
 */
export function ruleSentence(
  name: RuleName,
  side: 'above' | 'below',
  count: number,
  chart?: ChartName,
): string {
  const rule = parseRule(name);
  switch (rule.kind) {
    case 'limit': {
      if (chart === 'within' && side === 'below') return 'suspiciously even: stuck gauge or copied readings?';
      const limit = `beyond the ${side === 'above' ? 'upper' : 'lower'} limit`;
      return count > 1 ? `${count} ${limit}` : limit;
    }
    case 'zone': {
      const line = rule.sigma === 0 ? 'the centre line' : `${rule.sigma} σ`;
      const far = rule.sigma === 0 ? `${side} ${line}` : `more than ${line} ${side} the centre line`;
      if (rule.of === 1) return far;
      if (rule.need === rule.of) return `${Math.max(count, rule.of)} in a row ${far}`;
      return `${Math.min(Math.max(count, rule.need), rule.of)} of ${rule.of} in a row ${far}`;
    }
    case 'within':
      return `${Math.max(count, rule.of)} in a row within ${rule.sigma} σ of the centre line`;
    case 'mixture':
      return `${Math.max(count, rule.of)} in a row more than ${rule.sigma} σ away, on both sides`;
    case 'trend':
      return `${Math.max(count, rule.of)} in a row steadily ${side === 'above' ? 'rising' : 'falling'}`;
    case 'alternating':
      return `${Math.max(count, rule.of)} in a row alternating up and down`;
  }
}
