import { describe, expect, it } from 'vitest';
import { meanSpreadCharts } from '@/lib/control/mean-spread-charts';
import { rangeLaw, standardDeviationLaw } from '@/lib/control/spread-law';
import { LARGE_SUBGROUP, SMALL_SUBGROUP_RULES, spreadRuleFault } from '@/lib/control/spread-rules';
import type { StudyOptions } from '@/lib/control/study-chart';
import { threeWayCharts } from '@/lib/control/three-way-charts';
import { WESTERN_ELECTRIC } from '@/lib/control/rule';

const pairs = (ranges: readonly number[]) => ranges.map((range) => [0, range]);

/** Signals by rules on the range chart of pairs, limits from the first ten: ranges 0.5 and 1.5 by turns, centre 1. */
function signals(rule: string, ranges: readonly number[]) {
  const first = Array.from({ length: 10 }, (_, i) => (i % 2 === 0 ? 0.5 : 1.5));
  const options: StudyOptions = { rules: [], limits: 'classical', baseline: 10, spreadRules: [rule] };
  const [, range] = meanSpreadCharts(pairs([...first, ...ranges]), rangeLaw, options);
  return range?.signals.filter((signal) => signal.rule === rule).map(({ point, side }) => ({ point, side }));
}

// Western Electric, Statistical Quality Control Handbook (1956), range charts of small subgroups (from memory).
describe('the chart of the spread of small subgroups', () => {
  it('takes two beyond 2 σ, three beyond 1 σ and seven above the centre, above it only', () => {
    // d2 = 1.128 and d3 = 0.853 (ASTM MNL7), so σ of a range is 0.756 here: 1.9 lies beyond 1 σ, 2.6 beyond 2 σ.
    expect(signals('2-of-2-beyond-2-sigma', [2.6, 2.6])).toEqual([{ point: 12, side: 'above' }]);
    expect(signals('3-of-3-beyond-1-sigma', [1.9, 1.9, 1.9, 0.1, 0.1, 0.1])).toEqual([
      { point: 13, side: 'above' },
    ]);
    expect(signals('7-of-7-beyond-0-sigma', [0.9, ...Array<number>(7).fill(1.1)])).toEqual([
      { point: 18, side: 'above' },
    ]);
    expect(signals('7-of-7-beyond-0-sigma', Array<number>(9).fill(0.9))).toEqual([]);
  });

  it('takes six beyond 1 σ and ten below the centre, below it only', () => {
    expect(signals('6-of-6-beyond-1-sigma', Array<number>(6).fill(0.1))).toEqual([
      { point: 16, side: 'below' },
    ]);
    expect(signals('6-of-6-beyond-1-sigma', Array<number>(6).fill(1.9))).toEqual([]);
    expect(signals('10-of-10-beyond-0-sigma', [1.1, ...Array<number>(10).fill(0.9)])).toEqual([
      { point: 21, side: 'below' },
    ]);
  });

  it('refuses all other rules and says why', () => {
    for (const rule of ['two-of-three-beyond-2-sigma', 'eight-on-one-side', 'six-in-a-trend']) {
      expect(() => signals(rule, [])).toThrow(RangeError);
    }
    expect(spreadRuleFault('eight-on-one-side', 4)).toContain('fewer than 5 values');
    expect(spreadRuleFault('beyond-limit', 2)).toBeNull();
    for (const rule of [...SMALL_SUBGROUP_RULES.above, ...SMALL_SUBGROUP_RULES.below]) {
      expect(spreadRuleFault(rule, 2)).toBeNull();
    }
    expect(() => spreadRuleFault('unheard-of', 2)).toThrow(RangeError);
  });
});

describe('the chart of the spread of five values and more', () => {
  it('takes the four rules of the level chart, on both halves, but no pattern that asks for symmetry', () => {
    for (const rule of WESTERN_ELECTRIC) expect(spreadRuleFault(rule, LARGE_SUBGROUP)).toBeNull();
    for (const rule of ['fifteen-within-1-sigma', 'eight-beyond-1-sigma', 'fourteen-alternating']) {
      expect(spreadRuleFault(rule, 9)).toContain('symmetric');
    }
    const five = (s: number) => [-2 * s, -s, 0, s, 2 * s];
    const groups = [
      ...Array.from({ length: 10 }, (_, i) => five(i % 2 === 0 ? 1 : 1.4)),
      ...Array.from({ length: 8 }, () => five(1.1)),
    ];
    const [, s] = meanSpreadCharts(groups, standardDeviationLaw, {
      rules: [],
      limits: 'classical',
      baseline: 10,
      spreadRules: ['eight-on-one-side'],
    });
    expect(s?.signals).toMatchObject([{ point: 18, rule: 'eight-on-one-side', side: 'below' }]);
  });

  it('takes no rules beside lognormal limits', () => {
    const options = { rules: [], limits: 'probability' as const, spreadRules: ['beyond-3-sigma'] };
    expect(() =>
      threeWayCharts(
        [
          [1, 2],
          [1, 3],
          [2, 4],
        ],
        options,
      ),
    ).toThrow(RangeError);
  });
});
