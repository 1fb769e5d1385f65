import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { completionsAt } from '@/lib/control/completions-at';
import { signalEpisodes } from '@/lib/control/signal-episodes';
import { chartPoints } from './chart-points';

const judge = (points: ReturnType<typeof chartPoints>, from = 0, to = points.length) =>
  points.slice(from, to).flatMap((_, i) => completionsAt(points, from + i));

describe('signal episodes', () => {
  it('make one signal of a run that goes on', () => {
    const points = chartPoints(Array.from({ length: 12 }, () => 0.5));
    expect(signalEpisodes(judge(points))).toEqual([
      {
        chart: 'level',
        rule: 'eight-on-one-side',
        side: 'above',
        first: 7,
        participants: [0, 1, 2, 3, 4, 5, 6, 7],
        last: 11,
        count: 5,
      },
    ]);
  });

  it('begin anew after a gap, on the other side, and in a new regime', () => {
    const gap = chartPoints([4, 0, 4, 4, -4]).map((point) => ({ ...point, movingRange: null }));
    const beyond = gap.flatMap((_, i) => completionsAt(gap, i, ['beyond-3-sigma']));
    expect(signalEpisodes(beyond).map(({ side, first, last, count }) => [side, first, last, count])).toEqual([
      ['above', 0, 0, 1],
      ['above', 2, 3, 2],
      ['below', 4, 4, 1],
    ]);
    const revised = gap.map((point, i) => (i < 3 ? point : { ...point, regime: 'b' }));
    const split = revised.flatMap((_, i) => completionsAt(revised, i, ['beyond-3-sigma']));
    expect(signalEpisodes(split).map(({ first, last }) => [first, last])).toEqual([
      [0, 0],
      [2, 2],
      [3, 3],
      [4, 4],
    ]);
  });

  it('go on across the centre line where the rule uses both halves', () => {
    const points = chartPoints(Array.from({ length: 18 }, (_, i) => (i % 3 === 0 ? 0.5 : -0.5)));
    const found = points.flatMap((_, i) => completionsAt(points, i, ['fifteen-within-1-sigma']));
    expect(signalEpisodes(found)).toMatchObject([{ first: 14, last: 17, count: 4 }]);
  });

  it('of no completions are the open ones', () => {
    expect(signalEpisodes([])).toEqual([]);
  });

  it('come out the same judged piece by piece, judged twice, or in any order', () => {
    const levels = fc.array(fc.integer({ min: -7, max: 7 }), { minLength: 1, maxLength: 60 });
    fc.assert(
      fc.property(levels, fc.nat(), fc.nat(), (list, cut, back) => {
        const points = chartPoints(list.map((x) => x / 2)).map((point, i) => ({
          ...point,
          regime: i < 20 ? 'a' : 'b',
        }));
        const whole = signalEpisodes(judge(points));
        const middle = cut % points.length;
        const open = signalEpisodes(judge(points, 0, middle));
        expect(signalEpisodes(judge(points, middle), open)).toEqual(whole);
        const again = middle - (back % (middle + 1));
        const order = (a: { first: number; chart: string; rule: string }, b: typeof a) =>
          a.first - b.first || `${a.chart} ${a.rule}`.localeCompare(`${b.chart} ${b.rule}`);
        expect(signalEpisodes(judge(points, again), whole).sort(order)).toEqual([...whole].sort(order));
        expect(signalEpisodes(judge(points).reverse()).sort(order)).toEqual([...whole].sort(order));
      }),
    );
  });
});
