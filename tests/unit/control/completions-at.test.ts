import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { completionsAt, LOOK_BACK, type ChartPoint } from '@/lib/control/completions-at';
import { chartPoints, unitLimits } from './chart-points';

const ALL = [
  'beyond-3-sigma',
  'two-of-three-beyond-2-sigma',
  'four-of-five-beyond-1-sigma',
  'eight-on-one-side',
  'fifteen-within-1-sigma',
  'eight-beyond-1-sigma',
  'six-in-a-trend',
  'fourteen-alternating',
  '3-of-7-beyond-1.5-sigma',
];

/** Indices at which one rule completes on the level chart. */
function completed(levels: readonly number[], rule: string): number[] {
  const points = chartPoints(levels);
  return points.flatMap((_, i) =>
    completionsAt(points, i, [rule])
      .filter((c) => c.chart === 'level')
      .map((c) => c.index),
  );
}

const repeat = (n: number, value: number) => Array.from({ length: n }, () => value);

// Rules and counts: Western Electric, Statistical Quality Control Handbook (1956), and L. S. Nelson, J. Quality
// Technology 16, 237 (1984), both from memory.
describe('the rules on the level chart', () => {
  it('one beyond three sigma', () => {
    expect(completed([0, 3.1, -3.1, 2.9], 'beyond-3-sigma')).toEqual([1, 2]);
  });

  it('two of three beyond two sigma on the same side, whether in the middle lies one inside or not', () => {
    const rule = 'two-of-three-beyond-2-sigma';
    expect(completed([2.1, 0, 2.1], rule)).toEqual([2]);
    expect(completed([2.1, 2.1], rule)).toEqual([1]);
    expect(completed([2.1, 0, 0, 2.1], rule)).toEqual([]);
    expect(completed([2.1, -2.1, 0], rule)).toEqual([]);
  });

  it('marks only a point that takes part: two beyond and then one inside completes nothing new', () => {
    expect(completed([2.1, 2.1, 0], 'two-of-three-beyond-2-sigma')).toEqual([1]);
  });

  it('four of five beyond one sigma on the same side', () => {
    expect(completed([1.1, 1.1, 0, 1.1, 1.1], 'four-of-five-beyond-1-sigma')).toEqual([4]);
    expect(completed([-1.1, -1.1, 1.1, -1.1, -1.1, 0], 'four-of-five-beyond-1-sigma')).toEqual([4]);
    expect(completed([1.1, 1.1, 0, 0, 1.1, 1.1], 'four-of-five-beyond-1-sigma')).toEqual([]);
  });

  it('eight in a row on one side, broken by a point on the centre line', () => {
    expect(completed(repeat(9, 0.1), 'eight-on-one-side')).toEqual([7, 8]);
    expect(completed([...repeat(7, 0.1), 0, 0.1], 'eight-on-one-side')).toEqual([]);
    expect(completed([...repeat(7, 0.1), -0.1], 'eight-on-one-side')).toEqual([]);
  });

  it('fifteen in a row within one sigma', () => {
    expect(completed([...repeat(14, 0.5), -0.9, 0.2, 1.1], 'fifteen-within-1-sigma')).toEqual([14, 15]);
    expect(completed([...repeat(14, 0.5), 1], 'fifteen-within-1-sigma')).toEqual([]);
  });

  it('eight in a row beyond one sigma on both sides', () => {
    expect(completed([1.1, -1.1, 2, -2, 1.5, -1.5, 1.1, 1.2], 'eight-beyond-1-sigma')).toEqual([7]);
    expect(completed(repeat(8, 1.1), 'eight-beyond-1-sigma')).toEqual([]);
    expect(completed([1.1, -1.1, 2, 1, 1.5, -1.5, 1.1, 1.2], 'eight-beyond-1-sigma')).toEqual([]);
  });

  it('six in a trend, steadily up or down', () => {
    expect(completed([0, 0.1, 0.2, 0.3, 0.4, 0.5, 0.6], 'six-in-a-trend')).toEqual([5, 6]);
    expect(completed([0, -0.1, -0.2, -0.3, -0.4, -0.5], 'six-in-a-trend')).toEqual([5]);
    expect(completed([0, 0.1, 0.2, 0.2, 0.4, 0.5], 'six-in-a-trend')).toEqual([]);
  });

  it('fourteen alternating up and down', () => {
    const zigzag = Array.from({ length: 15 }, (_, i) => (i % 2 === 0 ? 0.5 : -0.5));
    expect(completed(zigzag, 'fourteen-alternating')).toEqual([13, 14]);
    expect(completed([...zigzag.slice(0, 13), 0.6], 'fourteen-alternating')).toEqual([]);
  });

  it('name the points that took part', () => {
    const [completion] = completionsAt(chartPoints([1.1, 1.1, 0, 1.1, 1.1]), 4);
    expect(completion).toMatchObject({
      rule: 'four-of-five-beyond-1-sigma',
      side: 'above',
      participants: [0, 1, 3, 4],
    });
  });

  it('do not count a point exactly on a line, however the line rounds', () => {
    expect(completed([3, -3], 'beyond-3-sigma')).toEqual([]);
    expect(completed([2, 2, -2, -2], 'two-of-three-beyond-2-sigma')).toEqual([]);
    const limits = { ...unitLimits, level: { centre: 10, sigma: 0.1, lower: 9.7, upper: 10.3 } };
    const points = chartPoints(repeat(5, 10.1), limits);
    expect(completionsAt(points, 4, ['four-of-five-beyond-1-sigma'])).toEqual([]);
  });
});

describe('the other charts', () => {
  const [first, second] = chartPoints([0, 0]) as [ChartPoint, ChartPoint];

  it('judge the moving range by its upper limit, but not at the first point of a regime', () => {
    const far = { ...second, movingRange: 5 };
    expect(completionsAt([first, far], 1)).toMatchObject([
      { chart: 'moving-range', rule: 'beyond-limit', side: 'above' },
    ]);
    expect(completionsAt([first, { ...far, regime: 'b' }], 1)).toEqual([]);
    expect(completionsAt([first, { ...far, movingRange: 4.243 }], 1)).toEqual([]);
  });

  it('judge the spread within on both sides', () => {
    expect(completionsAt([{ ...first, within: 2 }], 0)).toMatchObject([{ chart: 'within', side: 'above' }]);
    expect(completionsAt([{ ...first, within: 0 }], 0)).toMatchObject([{ chart: 'within', side: 'below' }]);
    expect(completionsAt([{ ...first, within: 1 }], 0)).toEqual([]);
  });

  it('judge the spread between by the limit for the number of wafers there are', () => {
    expect(completionsAt([{ ...first, between: 2.1, wafers: 3 }], 0)).toMatchObject([
      { chart: 'between', side: 'above' },
    ]);
    expect(completionsAt([{ ...first, between: 2.1, wafers: 2 }], 0)).toEqual([]);
    expect(completionsAt([{ ...first, between: 1.9, wafers: 5 }], 0)).toMatchObject([{ chart: 'between' }]);
    expect(completionsAt([{ ...first, between: 2.1, wafers: 1 }], 0)).toEqual([]);
  });
});

describe('judging', () => {
  it('yields nothing without limits and refuses a point that is not there or not finite', () => {
    expect(completionsAt(chartPoints([99], null), 0)).toEqual([]);
    expect(() => completionsAt([], 0)).toThrow(RangeError);
    expect(() => completionsAt(chartPoints([0]), -1)).toThrow(RangeError);
    expect(() => completionsAt(chartPoints([NaN]), 0)).toThrow(RangeError);
    expect(() => completionsAt(chartPoints([0]), 0, ['unheard-of'])).toThrow(RangeError);
  });

  it('never straddles a change of regime or a point without limits', () => {
    const points = chartPoints(repeat(9, 0.5));
    const changed = points.map((point, i) => (i < 4 ? point : { ...point, regime: 'b' }));
    const gap = points.map((point, i) => (i === 3 ? { ...point, limits: null } : point));
    for (const list of [changed, gap]) {
      expect(list.flatMap((_, i) => completionsAt(list, i))).toEqual([]);
    }
    expect(completionsAt(points, 8)).toHaveLength(1);
  });

  const levels = fc.array(fc.double({ min: -4, max: 4, noNaN: true }), { minLength: 1, maxLength: 60 });
  const series = fc.array(
    fc.record({
      level: fc.integer({ min: -8, max: 8 }),
      regime: fc.constantFrom('a', 'a', 'a', 'b'),
      gone: fc.integer({ max: 9, min: 0 }),
    }),
    { minLength: 1, maxLength: 60 },
  );

  it('depends on the points within the look-back and on nothing else', () => {
    fc.assert(
      fc.property(series, (list) => {
        const points = chartPoints(list.map(({ level }) => level / 2)).map((point, i) => ({
          ...point,
          regime: list[i]?.regime ?? 'a',
          limits: list[i]?.gone === 0 ? null : point.limits,
        }));
        points.forEach((_, i) => {
          const from = Math.max(0, i - LOOK_BACK);
          const window = points.slice(from, i + 1);
          const alone = completionsAt(window, i - from, ALL).map((c) => ({
            ...c,
            index: c.index + from,
            participants: c.participants.map((p) => p + from),
          }));
          expect(alone).toEqual(completionsAt(points, i, ALL));
        });
      }),
    );
  });

  it('finds the mirrored pattern on the mirrored chart', () => {
    fc.assert(
      fc.property(levels, (list) => {
        const points = chartPoints(list);
        const mirror = chartPoints(list.map((x) => -x));
        points.forEach((_, i) => {
          const swap = (side: string) => (side === 'above' ? 'below' : 'above');
          const seen = completionsAt(points, i, ALL).filter((c) => c.chart === 'level');
          const turned = completionsAt(mirror, i, ALL).filter((c) => c.chart === 'level');
          expect(turned.map((c) => [c.rule, swap(c.side), c.participants])).toEqual(
            seen.map((c) => [c.rule, c.side, c.participants]),
          );
        });
      }),
    );
  });

  it('is the same in other units and from another zero', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: -40, max: 40 }), { minLength: 1, maxLength: 40 }), (list) => {
        const tenths = list.map((x) => x / 10);
        const limits = {
          ...unitLimits,
          level: { centre: 1e4, sigma: 0.01, lower: 1e4 - 0.03, upper: 1e4 + 0.03 },
        };
        const points = chartPoints(tenths);
        const other = chartPoints(
          tenths.map((x) => 1e4 + x * 0.01),
          limits,
        );
        const zones = ALL.filter((rule) => !['six-in-a-trend', 'fourteen-alternating'].includes(rule));
        points.forEach((_, i) => {
          const seen = completionsAt(points, i, zones).filter((c) => c.chart === 'level');
          const moved = completionsAt(other, i, zones).filter((c) => c.chart === 'level');
          expect(moved).toEqual(seen);
        });
      }),
    );
  });
});
