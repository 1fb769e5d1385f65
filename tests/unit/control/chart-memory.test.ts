import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { MEMORY_BEGIN, memorySignals, nextMemory, type ChartMemory } from '@/lib/control/chart-memory';
import type { ChartPoint } from '@/lib/control/completions-at';
import { cusumCharts } from '@/lib/control/cusum-charts';
import { ewmaCharts } from '@/lib/control/ewma-charts';
import { CHECKPOINT_EVERY, replayed } from '@/lib/control/replayed';
import { chartPoints, unitLimits } from './chart-points';

const designs = { ewma: { lambda: 0.2, width: 2.962 }, cusum: { reference: 0.5, decision: 5 } };
const next = (memory: ChartMemory, point: ChartPoint) => nextMemory(memory, point, designs);

describe('what charts with memory know after each point', () => {
  it('gives the signals of the EWMA and CUSUM charts of the same values', () => {
    const shifted = Array.from({ length: 60 }, (_, i) => Math.sin(i * 12.9) * 1.4 + (i > 30 ? -1.3 : 0));
    let memory = MEMORY_BEGIN;
    const found = chartPoints(shifted).flatMap((point, i) => {
      memory = next(memory, point);
      return memorySignals(memory, designs).map((signal) => ({ ...signal, point: i + 1 }));
    });
    const given = { target: 0, sigma: 1 };
    const [ewma] = ewmaCharts(shifted, designs.ewma, { ...given, limits: 'steady' });
    const arms = cusumCharts(shifted, designs.cusum, given);
    expect(found.filter(({ chart }) => chart === 'ewma').map(({ point }) => point)).toEqual(
      ewma?.signals.map(({ point }) => point),
    );
    for (const arm of arms) {
      const side = arm.name === 'cusum-above' ? 'above' : 'below';
      const own = found.filter((signal) => signal.chart === 'cusum' && signal.side === side);
      expect(own.map(({ point }) => point)).toEqual(arm.signals.map(({ point }) => point));
    }
    expect(found.length).toBeGreaterThan(10);
  });

  it('begins afresh with a regime and at a point without limits', () => {
    const point = (level: number, regime: string, limits: ChartPoint['limits'] = unitLimits) => ({
      level,
      regime,
      limits,
    });
    const after = nextMemory(MEMORY_BEGIN, point(2, 'a'), designs);
    expect(nextMemory(after, point(2, 'a'), designs).cusum.above).toBe(3);
    expect(nextMemory(after, point(2, 'b'), designs)).toEqual({ ...after, regime: 'b' });
    expect(nextMemory(after, point(2, 'a', null), designs)).toBe(MEMORY_BEGIN);
    expect(() => nextMemory(after, point(NaN, 'a'), designs)).toThrow(RangeError);
  });
});

/** A stream that points come into and leave, with its checkpoints, and what each point left in memory. */
interface Held {
  points: ChartPoint[];
  checkpoints: ChartMemory[];
  after: ChartMemory[];
}

function change(held: Held, points: ChartPoint[], changed: number): Held {
  const replay = replayed(next, MEMORY_BEGIN, points, held.checkpoints, changed);
  expect(replay.from).toBeGreaterThan(changed - CHECKPOINT_EVERY);
  return {
    points,
    checkpoints: replay.checkpoints,
    after: [...held.after.slice(0, replay.from), ...replay.after],
  };
}

/** Arrivals and removals at places given as parts of the stream's length; most arrivals are at its end. */
const steps = fc.array(
  fc.record({
    place: fc.oneof({ weight: 3, arbitrary: fc.constant(1) }, fc.double({ min: 0, max: 1, noNaN: true })),
    gone: fc.boolean(),
    levels: fc.array(fc.integer({ min: -30, max: 30 }), { minLength: 1, maxLength: 150, size: 'max' }),
    regime: fc.constantFrom('a', 'a', 'a', 'b'),
  }),
  { minLength: 1, maxLength: 20, size: 'max' },
);

describe('a stream replayed from the checkpoint before each change ends as if replayed from the beginning', () => {
  it('when wafers come late, at the same time, are measured again or excluded', () => {
    let longest = 0;
    fc.assert(
      fc.property(steps, (changes) => {
        let held: Held = { points: [], checkpoints: [], after: [] };
        for (const { place, gone, levels, regime } of changes) {
          const at = Math.round(place * held.points.length);
          const points = [...held.points];
          if (gone && at < points.length) points.splice(at, Math.min(levels.length, 20));
          else points.splice(at, 0, ...chartPoints(levels.map((l) => l / 10)).map((p) => ({ ...p, regime })));
          held = change(held, points, Math.min(at, points.length));
        }
        longest = Math.max(longest, held.points.length);
        const clean = replayed(next, MEMORY_BEGIN, held.points, [], 0);
        expect(held.after).toEqual(clean.after);
        expect(held.checkpoints).toEqual(clean.checkpoints);
      }),
      { numRuns: 40, seed: 7 },
    );
    expect(longest).toBeGreaterThan(2 * CHECKPOINT_EVERY);
  });

  it('from the end of the stream alone, when it is given from the checkpoint on', () => {
    const points = chartPoints(Array.from({ length: 1000 }, (_, i) => Math.sin(i * 7.7)));
    const clean = replayed(next, MEMORY_BEGIN, points, [], 0);
    const end = replayed(next, MEMORY_BEGIN, points.slice(768), clean.checkpoints, 999, 768);
    expect(end.after).toEqual(clean.after.slice(768));
    expect(end.checkpoints).toEqual(clean.checkpoints);
    expect(() => replayed(next, MEMORY_BEGIN, points.slice(800), clean.checkpoints, 999, 800)).toThrow(
      RangeError,
    );
    expect(() => replayed(next, MEMORY_BEGIN, points, [], 1001)).toThrow(RangeError);
  });
});
