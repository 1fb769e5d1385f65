import { describe, expect, it } from 'vitest';
import { followingRunLength } from '@/lib/control/following-run-length';
import { limitSet } from '@/lib/control/limit-set';
import { WESTERN_ELECTRIC } from '@/lib/control/rule';
import { ruleRunLength } from '@/lib/control/rule-run-length';
import { seededRandom } from '@/lib/stats/seeded-random';

describe('the run length of values that follow each other', () => {
  it('is that of Champ and Woodall where they do not', () => {
    // C. W. Champ and W. H. Woodall, Technometrics 29, 393 (1987): 91.75 in control, 9.22 at a shift of 1 σ.
    for (const [shift, published] of [
      [0, 91.75],
      [1, 9.22],
    ] as const) {
      const { averageRunLength, standardError } = followingRunLength(
        WESTERN_ELECTRIC,
        { lagOne: 0, shift },
        seededRandom('independent'),
      );
      expect(Math.abs(averageRunLength - published)).toBeLessThan(3.5 * standardError);
    }
  });

  it('falls steeply where limits come from moving ranges, and less where they come from the long run', () => {
    const of = (sigma: 'long-run' | 'moving-range') =>
      followingRunLength(['beyond-3-sigma'], { lagOne: 0.5, sigma }, seededRandom('following'), 1500)
        .averageRunLength;
    // Lines at 3·√½ σ: the share of single values beyond them is that of a run length of 29.5 without correlation.
    const atOnce = ruleRunLength(['beyond-3-sigma'], { spread: Math.SQRT2 });
    expect(of('moving-range')).toBeLessThan(1.6 * atOnce);
    expect(of('moving-range')).toBeGreaterThan(atOnce);
    expect(of('long-run')).toBeGreaterThan(300);
  });

  it('takes moving ranges to see √(1 − ρ) of the long-run σ, as limits from a long baseline do', () => {
    const source = seededRandom('ranges');
    let value = source.normal();
    const levels = Array.from({ length: 40_000 }, () => {
      value = 0.6 * value + 0.8 * source.normal();
      return { level: value, within: null, between: null, wafers: 1 };
    });
    expect(limitSet(levels).level.sigma).toBeCloseTo(Math.sqrt(0.4), 1);
  });

  it('is refused without a long run', () => {
    for (const lagOne of [1, -1, NaN]) {
      expect(() => followingRunLength(WESTERN_ELECTRIC, { lagOne }, seededRandom('none'))).toThrow(
        RangeError,
      );
    }
  });
});
