import { describe, expect, it } from 'vitest';
import { type LimitedPoint, type LimitRevision, limitSpans } from '@/app/_charts/limit-spans';
import { betweenLimitsFor } from '@/lib/control/between-limits';
import { c4 } from '@/lib/stats/c4';

const LIMITS = {
  n: 25,
  level: { centre: 10, sigma: 0.1, lower: 9.7, upper: 10.3 },
  movingRange: { centre: 0.11, upper: 0.42 },
  within: { logMean: 0, logSigma: 0.1, lower: 0.7, centre: 1, upper: 1.4 },
  between: { centre: 0.2, upper: 0.5, wafers: 3 },
};
const revision = (id: string, n = 25, state: LimitRevision['state'] = 'approved'): LimitRevision => ({
  id,
  revision: Number(id),
  state,
  limits: { ...LIMITS, n },
});
const judged = (...ids: (string | null)[]) =>
  ids.map((limitsId): LimitedPoint => ({ state: 'judged', limitsId, between: null, wafers: 1 }));
const left = (state: 'open' | 'not-judged'): LimitedPoint => ({
  state,
  limitsId: null,
  between: null,
  wafers: 0,
});

describe('limits of a stretch', () => {
  it('are one span for each run of subgroups judged by one revision', () => {
    const spans = limitSpans(judged(null, '1', '1', '2'), [revision('2'), revision('1')]);
    expect(spans.map(({ revision: number, fromIndex, toIndex }) => [number, fromIndex, toIndex])).toEqual([
      [1, 1, 2],
      [2, 3, 3],
    ]);
  });

  it('go on over subgroups that are not judged', () => {
    const points = [...judged('1'), left('not-judged'), ...judged('1')];
    expect(limitSpans(points, [revision('1')])).toMatchObject([{ fromIndex: 0, toIndex: 2 }]);
    const open = [...judged('1'), left('open')];
    expect(limitSpans(open, [revision('1')])).toMatchObject([{ fromIndex: 0, toIndex: 1 }]);
    const before = [left('not-judged'), ...judged('1')];
    expect(limitSpans(before, [revision('1')])).toMatchObject([{ fromIndex: 1, toIndex: 1 }]);
  });

  it('come with their own interval until they are established, wider the fewer subgroups made them', () => {
    const width = (one: LimitRevision) => {
      const [low = 0, high = 0] = limitSpans(judged('1'), [one])[0]?.level.upperInterval ?? [];
      return high - low;
    };
    expect(limitSpans(judged('1'), [revision('1', 61)])[0]?.state).toBe('young');
    expect(limitSpans(judged('1'), [revision('1', 24)])[0]?.state).toBe('provisional');
    expect(width(revision('1', 24))).toBeGreaterThan(width(revision('1', 61)));
    expect(width(revision('1', 25, 'provisional'))).toBe(width(revision('1', 25)));
    expect(width(revision('1', 101))).toBe(0);
    expect(limitSpans(judged('1'), [revision('1', 101)])[0]?.state).toBe('established');
  });

  it('have no interval where nobody knows how many subgroups made them, as of inherited ones', () => {
    const [span] = limitSpans(judged('1'), [revision('1', 0)]);
    expect(span).toMatchObject({ state: 'provisional' });
    expect([span?.level.upperInterval, span?.within?.upperInterval]).toEqual([undefined, undefined]);
  });

  it('are in the unit of the chart, but the spread within stays percent', () => {
    const [span] = limitSpans(judged('1'), [revision('1', 61)], { factor: 1000 });
    expect(span?.level.centre).toBe(10_000);
    expect(span?.within?.upper).toBe(1.4);
    const [low, high] = span?.within?.upperInterval ?? [];
    expect(low).toBeLessThan(1.4);
    expect(high).toBeGreaterThan(1.4);
    expect(high).toBeLessThan(3);
  });
});

describe('the limit of the spread between wafers', () => {
  const sized = (...sizes: number[]) =>
    sizes.map((wafers): LimitedPoint => ({
      state: 'judged',
      limitsId: '1',
      between: wafers < 2 ? null : 0.1,
      wafers,
    }));

  it('is the one that judged each subgroup, whatever its number of wafers', () => {
    const [span] = limitSpans(sized(3, 3, 2, 3), [revision('1')], { factor: 10 });
    const two = betweenLimitsFor(LIMITS.between, 2);
    expect(span?.between).toEqual([
      { fromIndex: 0, centre: 2, upper: 5 },
      { fromIndex: 2, centre: 10 * two.centre, upper: 10 * two.upper },
      { fromIndex: 3, centre: 2, upper: 5 },
    ]);
    expect(two.upper).toBeGreaterThan(LIMITS.between.upper);
    expect(two.centre).toBeCloseTo((0.2 / c4(3)) * c4(2), 12);
  });

  it('does not turn at a subgroup of one wafer, which has no such spread, nor at one that is not drawn', () => {
    expect(limitSpans(sized(3, 1, 3), [revision('1')])[0]?.between).toHaveLength(1);
    const isDrawn = (index: number) => index !== 1;
    expect(limitSpans(sized(3, 2, 3), [revision('1')], { isDrawn })[0]?.between).toHaveLength(1);
  });

  it('is none where no subgroup has several wafers', () => {
    expect(limitSpans(sized(1, 1), [revision('1')])[0]?.between).toEqual([]);
  });
});
