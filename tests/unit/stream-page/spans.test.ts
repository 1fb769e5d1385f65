import { describe, expect, it } from 'vitest';
import { dopingScale } from '@/app/(line)/streams/[slug]/doping-scale';
import { eventMarks } from '@/app/(line)/streams/[slug]/event-marks';
import { expectedSpans } from '@/app/(line)/streams/[slug]/expected-spans';
import { targetModel } from '@/lib/excursions/target-model';
import { expectedValue } from '@/lib/physics/expected-value';
import { BORON, MINUTE, spanPoint } from './fixtures';

describe('what physics expects along a stretch', () => {
  const model = targetModel(BORON, null);
  const row = (index: number, value: number | null, targetId = 't1') => ({
    index,
    level: 10,
    expected: value === null ? null : { targetId, value, uncertaintyPercent: 2, model },
  });

  it('is one span for each value, its uncertainty inside and the tolerance apart', () => {
    const value = expectedValue(BORON).value;
    const rows = [row(0, value), row(1, value), row(5, 2 * value, 't2'), row(6, null)];
    const [first, second] = expectedSpans(rows, { isRelative: false, factor: 1 });
    expect([first?.fromIndex, first?.toIndex, second?.fromIndex, second?.toIndex]).toEqual([0, 4, 5, 5]);
    expect(first?.upper).toBeCloseTo(value * 1.02, 10);
    expect(first?.toleranceLower).toBeCloseTo(expectedValue(BORON).toleranceLower ?? 0, 10);
  });

  it('is 0 % on a relative chart, one span for one target', () => {
    const spans = expectedSpans([row(0, 13), row(1, 14)], { isRelative: true, factor: 1 });
    expect(spans).toHaveLength(1);
    expect(spans[0]?.value).toBe(0);
    expect(spans[0]?.upper).toBeCloseTo(100 * Math.log(1.02), 10);
    expect(spans[0]?.lower).toBeCloseTo(100 * Math.log(0.98), 10);
  });

  it('has no tolerance where none is agreed, and nothing where nothing is expected', () => {
    const free = targetModel({ ...BORON, tolerancePercent: null }, null);
    const rows = [
      { index: 0, level: 10, expected: { targetId: 't', value: 13, uncertaintyPercent: 2, model: free } },
    ];
    expect(expectedSpans(rows, { isRelative: false, factor: 1 })[0]?.toleranceUpper).toBeNull();
    expect(expectedSpans([row(0, null)], { isRelative: false, factor: 1 })).toEqual([]);
    expect(expectedSpans([], { isRelative: true, factor: 1 })).toEqual([]);
  });
});

describe('the doping scale', () => {
  it('puts round densities where the conversion puts them, in the unit of the chart', () => {
    const options = { isRelative: false, factor: 1000, sensitivity: null };
    const { ticks, unit } = dopingScale(BORON, [12_500, 14_000], options);
    expect(unit).toBe('10¹⁵ cm⁻³ boron');
    const one = ticks.find((tick) => tick.label === '1.00');
    expect((one?.value ?? 0) / 1000).toBeCloseTo(expectedValue(BORON).value, 9);
  });

  it('is in percent off target on a relative chart, falling as readings rise', () => {
    const options = { isRelative: true, factor: 1, sensitivity: -1 };
    const { ticks, unit } = dopingScale(BORON, [-3, 3], options);
    expect(unit).toBe('% boron off target');
    expect(ticks.map((tick) => tick.label)).toContain('+2');
    expect(ticks.find((tick) => tick.label === '+2')?.value).toBeCloseTo(-100 * Math.log(1.02), 10);
    expect(ticks.find((tick) => tick.label === '0')?.value).toBeCloseTo(0, 12);
  });

  it('is empty where the chart has no height or the axis lies outside the conversion', () => {
    const options = { isRelative: false, factor: 1, sensitivity: null };
    expect(dopingScale(BORON, [1, 1], options).ticks).toEqual([]);
    expect(dopingScale(BORON, [1e9, 2e9], options).ticks).toEqual([]);
    expect(dopingScale(BORON, [-5, -1], options).ticks).toEqual([]);
  });
});

describe('events along a stretch', () => {
  const points = [0, 1, 2].map((nth) => spanPoint(nth));
  const event = (minutes: number, restart = false) => ({
    id: '1',
    kind: 'maintenance' as const,
    at: new Date((points[0]?.at ?? 0) + minutes * MINUTE),
    restart,
    text: 'Boat changed.',
    actor: 'someone',
    recordedAt: new Date(0),
  });

  it('stand half a step before the first subgroup that came after', () => {
    expect(eventMarks(points, [event(1.5), event(9), event(-1)], []).map(({ index }) => index)).toEqual([
      -0.5, 1.5, 2.5,
    ]);
  });

  it('say that rules start afresh, and where other limits took over', () => {
    const limits = [
      { fromIndex: 0, revision: 1, state: 'provisional' as const },
      { fromIndex: 2, revision: 2, state: 'young' as const },
    ];
    expect(eventMarks(points, [event(0.5, true)], limits)).toEqual([
      { kind: 'maintenance', index: 0.5, text: 'Boat changed. Rules start afresh.' },
      { kind: 'limits', index: 1.5, text: 'limits 2' },
    ]);
  });
});
