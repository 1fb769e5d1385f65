import { describe, expect, it } from 'vitest';
import { limitSegments } from '@/app/_charts/limit-segments';
import type { LimitSpan } from '@/app/_charts/stream-chart-point';

const span: LimitSpan = {
  fromIndex: 0,
  toIndex: 24,
  revision: 1,
  state: 'provisional',
  level: { centre: 5, lower: 4, upper: 6, lowerInterval: [3.8, 4.2], upperInterval: [5.8, 6.2] },
  movingRange: { centre: 0.3, upper: 1.1 },
  within: { lower: 0.4, centre: 0.7, upper: 1.2, lowerInterval: [0.3, 0.5], upperInterval: [1, 1.5] },
  between: [],
};
const later: LimitSpan = { ...span, fromIndex: 25, toIndex: 60, revision: 2, state: 'young' };
const all = { from: 0, to: 60 };

describe('limitSegments', () => {
  it('draws each revision over the points it judged, half a step to either side', () => {
    const xs = limitSegments([span, later], 'moving-range', all).map(({ fromX, toX }) => [fromX, toX]);
    expect(xs).toEqual([
      [-0.5, 24.5],
      [-0.5, 24.5],
      [24.5, 60.5],
      [24.5, 60.5],
    ]);
  });

  it('dashes provisional limits, and shows the interval of every limit that has one', () => {
    const level = limitSegments([span, later], 'level', all);
    expect(level.map((one) => one.dashed)).toEqual([true, true, true, false, false, false]);
    const own = [null, [3.8, 4.2], [5.8, 6.2]];
    expect(level.map((one) => one.interval)).toEqual([...own, ...own]);
    const within = limitSegments([later], 'within', all);
    expect(within.map((one) => one.interval)).toEqual([null, [0.3, 0.5], [1, 1.5]]);
    const settled = { ...later, state: 'established' as const, level: { centre: 5, lower: 4, upper: 6 } };
    expect(limitSegments([settled], 'level', all).map((one) => one.interval)).toEqual([null, null, null]);
  });

  it('gives nothing where a chart has no limits, or the revision lies outside the view', () => {
    expect(limitSegments([span], 'between', all)).toEqual([]);
    expect(limitSegments([{ ...span, within: null }], 'within', all)).toEqual([]);
    expect(limitSegments([span], 'level', { from: 30, to: 60 })).toEqual([]);
    expect(limitSegments([], 'level', all)).toEqual([]);
  });

  it('stops at the edges of the view', () => {
    const [first] = limitSegments([later], 'between', all).concat(
      limitSegments([later], 'within', { from: 30, to: 40 }),
    );
    expect([first?.fromX, first?.toX]).toEqual([29.5, 40.5]);
  });

  it('steps the limits of the spread between wafers where the number of wafers turns', () => {
    const between = [
      { fromIndex: 3, centre: 0.2, upper: 0.5 },
      { fromIndex: 10, centre: 0.15, upper: 0.6 },
      { fromIndex: 11, centre: 0.2, upper: 0.5 },
    ];
    const lines = limitSegments([{ ...span, between }], 'between', { from: 5, to: 60 });
    expect(lines.map((one) => [one.part, one.y, one.fromX, one.toX])).toEqual([
      ['centre', 0.2, 4.5, 9.5],
      ['limit', 0.5, 4.5, 9.5],
      ['centre', 0.15, 9.5, 10.5],
      ['limit', 0.6, 9.5, 10.5],
      ['centre', 0.2, 10.5, 24.5],
      ['limit', 0.5, 10.5, 24.5],
    ]);
    const [first] = limitSegments([{ ...span, between }], 'between', all);
    expect(first?.fromX).toBe(-0.5);
  });
});
