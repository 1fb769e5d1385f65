import { describe, expect, it } from 'vitest';
import { LOOK_BACK, parseRule, ruleFamily, ruleSentence, WESTERN_ELECTRIC } from '@/lib/control/rule';

describe('rules by name', () => {
  it('parse to what they ask', () => {
    expect(parseRule('two-of-three-beyond-2-sigma')).toMatchObject({
      kind: 'zone',
      need: 2,
      of: 3,
      sigma: 2,
    });
    expect(parseRule('3-of-4-beyond-1.5-sigma')).toMatchObject({ kind: 'zone', need: 3, of: 4, sigma: 1.5 });
    for (const name of WESTERN_ELECTRIC) expect(parseRule(name).name).toBe(name);
  });

  it('are refused when unknown, impossible, or looking back further than any rule may', () => {
    const names = [
      '',
      'beyond',
      '0-of-3-beyond-1-sigma',
      '4-of-3-beyond-1-sigma',
      '2-of-16-beyond-1-sigma',
      '1-of-1-beyond--1-sigma',
    ];
    for (const name of names) expect(() => parseRule(name)).toThrow(RangeError);
    expect(parseRule('15-of-15-beyond-0-sigma').of).toBe(LOOK_BACK + 1);
  });

  it('belong to instability or to other patterns, as in the Western Electric handbook', () => {
    for (const name of [...WESTERN_ELECTRIC, 'beyond-limit', '2-of-2-beyond-2-sigma']) {
      expect(ruleFamily(name)).toBe('instability');
    }
    for (const name of [
      'fifteen-within-1-sigma',
      'eight-beyond-1-sigma',
      'six-in-a-trend',
      'fourteen-alternating',
    ]) {
      expect(ruleFamily(name)).toBe('pattern');
    }
  });

  it('read as plain sentences', () => {
    expect(ruleSentence('eight-on-one-side', 'below', 8)).toBe('8 in a row below the centre line');
    expect(ruleSentence('eight-on-one-side', 'above', 11)).toBe('11 in a row above the centre line');
    expect(ruleSentence('beyond-3-sigma', 'below', 1)).toBe('beyond the lower limit');
    expect(ruleSentence('two-of-three-beyond-2-sigma', 'above', 2)).toBe(
      '2 of 3 in a row more than 2 σ above the centre line',
    );
    expect(ruleSentence('six-in-a-trend', 'below', 6)).toBe('6 in a row steadily falling');
    expect(ruleSentence('fifteen-within-1-sigma', 'below', 15)).toBe(
      '15 in a row within 1 σ of the centre line',
    );
    expect(ruleSentence('beyond-limit', 'below', 1, 'within')).toBe(
      'suspiciously even: stuck gauge or copied readings?',
    );
    expect(ruleSentence('beyond-limit', 'above', 1, 'within')).toBe('beyond the upper limit');
  });
});
