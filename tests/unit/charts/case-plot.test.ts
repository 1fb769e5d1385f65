import { describe, expect, it } from 'vitest';
import { casePlot, type CasePlotInput, type CasePlotPoint } from '@/app/_charts/case-plot';

const size = { width: 600, height: 200 };

function input(values: readonly (number | null)[], change: Partial<CasePlotInput> = {}): CasePlotInput {
  const points = values.map((value, index): CasePlotPoint => {
    return { index, day: `${index} Mar`, value, shape: 'dot', tookPart: false };
  });
  const limits = {
    fromIndex: 0,
    toIndex: values.length - 1,
    revision: 1,
    state: 'young' as const,
    level: {
      centre: 10,
      lower: 7,
      upper: 13,
      lowerInterval: [6, 8] as const,
      upperInterval: [12, 14] as const,
    },
    movingRange: { centre: 1, upper: 4 },
    within: null,
    between: [],
  };
  return {
    chart: 'level',
    points,
    limits: [limits],
    specification: [],
    events: [],
    reach: { from: 1, to: 2 },
    ...change,
  };
}

describe('the chart of a case', () => {
  it('stands inside its frame, higher values higher', () => {
    const { marks, frame } = casePlot(input([8, 12, 10]), size);
    for (const { x, y } of marks) {
      expect(x).toBeGreaterThan(frame.left);
      expect(x).toBeLessThan(frame.right);
      expect(y).toBeGreaterThan(frame.top);
      expect(y).toBeLessThan(frame.bottom);
    }
    expect(marks[1]?.y).toBeLessThan(marks[0]?.y ?? 0);
  });

  it('washes the reach of the case, half a step to either side', () => {
    const { wash, marks } = casePlot(input([8, 9, 10, 11]), size);
    const step = (marks[1]?.x ?? 0) - (marks[0]?.x ?? 0);
    expect(wash.x).toBeCloseTo((marks[1]?.x ?? 0) - step / 2, 0);
    expect(wash.width).toBeCloseTo(2 * step, 0);
  });

  it('keeps gaps gaps, and passes by what is left out', () => {
    expect(casePlot(input([8, 9, null, 10, 11]), size).lines).toHaveLength(2);
    const crossed = input([8, 9, 10]);
    const points = crossed.points.map((point, at) =>
      at === 1 ? { ...point, shape: 'cross' as const } : point,
    );
    const plot = casePlot({ ...crossed, points }, size);
    expect(plot.lines[0]?.split(' ')).toHaveLength(2);
    expect(plot.marks).toHaveLength(3);
  });

  it('draws the specification only where it does not squeeze the points', () => {
    const of = (lower: number | null, upper: number | null) => ({ fromIndex: 0, toIndex: 1, lower, upper });
    expect(casePlot(input([8, 12], { specification: [of(6, null)] }), size).specification).toHaveLength(1);
    expect(casePlot(input([8, 12], { specification: [of(null, 1000)] }), size).specification).toEqual([]);
  });

  it('draws each specification over the subgroups it held for, half a step to either side', () => {
    const specification = [
      { fromIndex: 0, toIndex: 1, lower: 7, upper: null },
      { fromIndex: 2, toIndex: 3, lower: 8, upper: null },
    ];
    const plot = casePlot(input([9, 9, 10, 11], { specification }), size);
    const [first, second] = plot.specification;
    expect(first?.x1).toBe(plot.frame.left);
    expect(first?.x2).toBe(second?.x1);
    expect(second?.x2).toBe(plot.frame.right);
    expect(second?.y).toBeLessThan(first?.y ?? 0);
  });

  it('keeps the interval of a limit inside the frame, however wide it is', () => {
    const [span] = input([9, 11]).limits;
    if (span === undefined) throw new Error('no limits');
    const wide = { ...span, level: { ...span.level, upperInterval: [-1e6, 1e6] as const } };
    const { limits, frame } = casePlot(input([9, 11], { limits: [wide] }), size);
    const interval = limits.find((one) => one.part === 'limit' && one.interval?.top === frame.top)?.interval;
    expect(interval).toEqual({ top: frame.top, bottom: frame.bottom });
  });

  it('holds for one point and for none', () => {
    expect(casePlot(input([10]), size).marks).toHaveLength(1);
    const none = casePlot(input([], { limits: [], reach: { from: 0, to: 0 } }), size);
    expect(none.marks).toHaveLength(0);
    expect(none.lines).toHaveLength(0);
  });
});
