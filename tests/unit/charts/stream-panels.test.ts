import { describe, expect, it } from 'vitest';
import { chartValue } from '@/app/_charts/chart-value';
import type { ExpectedSpan, LimitSpan, StreamChartPoint } from '@/app/_charts/stream-chart-point';
import { streamPanels } from '@/app/_charts/stream-panels';

const texts = {
  level: '',
  at: '',
  expected: null,
  difference: null,
  dopant: null,
  density: null,
  onBefore: null,
  movingRange: null,
  within: null,
  between: null,
  notes: [],
};

const point = (index: number, level: number, more: Partial<StreamChartPoint> = {}): StreamChartPoint => ({
  id: String(index),
  index,
  label: `run ${index}`,
  at: '2031-11-01T00:00:00Z',
  day: '1 Nov',
  level,
  movingRange: 0.1,
  within: 0.7,
  between: null,
  completions: [],
  outOfSpecification: false,
  open: false,
  judged: true,
  hollow: false,
  href: '/',
  texts,
  ...more,
});

const limits: LimitSpan = {
  fromIndex: 0,
  toIndex: 9,
  revision: 1,
  state: 'established',
  level: { centre: 5, lower: 4.5, upper: 5.5 },
  movingRange: { centre: 0.1, upper: 0.4 },
  within: { lower: 0.4, centre: 0.7, upper: 1.2 },
  between: [],
};

const expected = (half: number, tolerance: number): ExpectedSpan => ({
  fromIndex: 0,
  toIndex: 9,
  value: 5,
  lower: 5 - half,
  upper: 5 + half,
  toleranceLower: 5 - tolerance,
  toleranceUpper: 5 + tolerance,
});

const units = { level: 'Ω·cm', 'moving-range': 'Ω·cm', within: '%', between: 'Ω·cm' };
const view = { from: 0, to: 9 };
const plan = (points: StreamChartPoint[], spans: ExpectedSpan[] = []) =>
  streamPanels({ points, limits: [limits], expected: spans, view, units });

describe('streamPanels', () => {
  it('has three charts, and a fourth where any point has a spread between its wafers', () => {
    expect(plan([point(0, 5)]).map((panel) => panel.chart)).toEqual(['level', 'moving-range', 'within']);
    expect(plan([point(0, 5), point(1, 5, { between: 0.02 })]).at(-1)?.chart).toBe('between');
  });

  it('holds every point and limit on its axis', () => {
    for (const panel of plan([point(0, 5), point(1, 3.9), point(2, 5.2, { within: 2 })])) {
      const [low, high] = panel.domain;
      const values = [point(1, 3.9), point(2, 5.2, { within: 2 })].map(
        (one) => chartValue(one, panel.chart) ?? low,
      );
      for (const value of [...values, ...panel.segments.map((piece) => piece.y)]) {
        expect(value).toBeGreaterThanOrEqual(low);
        expect(value).toBeLessThanOrEqual(high);
      }
    }
  });

  it('draws the expected band on the level alone, and only where it lies in the view', () => {
    expect(plan([point(0, 5)], [expected(0.1, 0.2)]).map((panel) => panel.expected.length)).toEqual([
      1, 0, 0,
    ]);
    const past = { ...expected(0.1, 0.2), fromIndex: 20, toIndex: 30 };
    expect(plan([point(0, 5)], [past])[0]?.expected).toEqual([]);
  });

  it('makes room for a tolerance, but not for one so wide that it would squeeze the points', () => {
    const upper = (tolerance: number) => plan([point(0, 5)], [expected(0.1, tolerance)])[0]?.domain[1] ?? 0;
    expect(upper(0.9)).toBeGreaterThan(5.9);
    expect(upper(50)).toBeLessThan(6);
  });

  it('draws an empty stretch without failing', () => {
    expect(
      streamPanels({ points: [], limits: [], expected: [], view: { from: 0, to: 0 }, units }),
    ).toHaveLength(3);
  });
});
