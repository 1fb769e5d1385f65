import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { absorbingChain } from '@/lib/control/absorbing-chain';
import { completionsAt } from '@/lib/control/completions-at';
import { extrapolated } from '@/lib/control/extrapolated';
import { WESTERN_ELECTRIC } from '@/lib/control/rule';
import { ruleRunLength } from '@/lib/control/rule-run-length';
import { ruleWalk } from '@/lib/control/rule-walk';
import { simulatedRunLength } from '@/lib/control/simulated-run-length';
import { seededRandom } from '@/lib/stats/seeded-random';
import { chartPoints } from './chart-points';

const names = [
  ...WESTERN_ELECTRIC,
  'fifteen-within-1-sigma',
  'eight-beyond-1-sigma',
  'six-in-a-trend',
  'fourteen-alternating',
  '3-of-4-beyond-1.5-sigma',
  '2-of-2-beyond-0-sigma',
  '5-of-5-beyond-1-sigma',
];

/** The place of the first signal among the levels, counted from 1, or null. */
function firstByWalk(rules: string[], levels: readonly number[]): number | null {
  const walk = ruleWalk(rules);
  const found = levels.findIndex((level) => walk.signals(level));
  return found < 0 ? null : found + 1;
}

function firstByJudging(rules: string[], levels: readonly number[]): number | null {
  const points = chartPoints(levels);
  const found = points.findIndex((_, i) =>
    completionsAt(points, i, rules).some(({ chart }) => chart === 'level'),
  );
  return found < 0 ? null : found + 1;
}

/** Levels that lie off every line and keep to one part of the chart for a while, so that patterns complete. */
const levels = fc
  .array(
    fc.record({
      around: fc.constantFrom(-2.3, -1.2, 0, 0, 1.2, 2.3),
      width: fc.constantFrom(0.05, 0.7, 2),
      parts: fc.array(fc.integer({ min: -997, max: 997 }), { minLength: 1, maxLength: 16 }),
    }),
    { minLength: 1, maxLength: 5 },
  )
  .map((spans) =>
    spans.flatMap(({ around, width, parts }) => parts.map((p) => around + (width * p) / 1013 + 1e-7)),
  );

describe('a chart walked point by point', () => {
  it('signals first where the judge of points does, by any set of rules', () => {
    const rules = fc.uniqueArray(fc.constantFrom(...names), { minLength: 1, maxLength: 4 });
    let signals = 0;
    fc.assert(
      fc.property(rules, levels, (set, values) => {
        const first = firstByJudging(set, values);
        if (first !== null) signals++;
        expect(firstByWalk(set, values)).toBe(first);
      }),
      { numRuns: 150, seed: 5 },
    );
    expect(signals).toBeGreaterThan(50);
  });

  it.each(names)('signals first where the judge of points does, by %s alone', (name) => {
    fc.assert(
      fc.property(levels, (values) => {
        expect(firstByWalk([name], values)).toBe(firstByJudging([name], values));
      }),
      { numRuns: 25, seed: 6 },
    );
  });

  it('begins afresh after a restart', () => {
    const walk = ruleWalk(['2-of-2-beyond-0-sigma', 'six-in-a-trend']);
    for (const z of [1, -1]) expect(walk.signals(z)).toBe(false);
    walk.restart();
    expect(walk.signals(-1)).toBe(false);
    expect(walk.signals(-1)).toBe(true);
  });

  it('is refused with no rules or unknown ones', () => {
    expect(() => ruleWalk([])).toThrow(RangeError);
    expect(() => ruleWalk(['unheard-of'])).toThrow(RangeError);
  });
});

/**
 * Mean wait for six independent values in order, by a chain over the place of the newest value in its distribution
 * (cells of equal probability) and the 2 to 5 values that rise up to it. A fall of two is a rise of two seen from the
 * other end. A value in the same cell is above or below with even chances.
 */
function trendWait(cells: number): number {
  const size = 4 * cells;
  const kept = new Float64Array(size * size);
  for (let run = 0; run < 4; run++) {
    for (let from = 0; from < cells; from++) {
      for (let to = 0; to < cells; to++) {
        const [up, down] = to > from ? [1, 0] : to < from ? [0, 1] : [0.5, 0.5];
        const row = (run * cells + from) * size;
        const [risen, turned] = [row + (run + 1) * cells + to, row + (cells - 1 - to)];
        if (run < 3) kept[risen] = (kept[risen] ?? 0) + up / cells;
        kept[turned] = (kept[turned] ?? 0) + down / cells;
      }
    }
  }
  const wait = absorbingChain(kept, size).steps();
  return Array.from({ length: cells }, (_, i) => i).reduce(
    (sum, i) => sum + ((2 * (i + 0.5)) / cells / cells) * (wait[i] ?? 0),
    2,
  );
}

describe('a simulated run length', () => {
  const simulated = (rules: string[], shift: number, runs: number) => {
    const walk = ruleWalk(rules);
    const source = seededRandom('a simulated run length');
    return simulatedRunLength(() => {
      walk.restart();
      return () => walk.signals(shift + source.normal());
    }, runs);
  };

  it.each<[string[], number]>([
    [['beyond-3-sigma'], 1],
    [[...WESTERN_ELECTRIC], 0],
    [['beyond-3-sigma', 'fifteen-within-1-sigma', 'eight-beyond-1-sigma'], 0],
    [['3-of-4-beyond-1.5-sigma'], 0],
  ])('of %j at a shift of %d lies within 3.5 standard errors of the exact one', (rules, shift) => {
    const { averageRunLength, standardError } = simulated(rules, shift, 4000);
    expect(Math.abs(averageRunLength - ruleRunLength(rules, { shift }))).toBeLessThan(3.5 * standardError);
    expect(standardError / averageRunLength).toBeLessThan(0.02);
  });

  it('of six in a trend is that of the order of independent values', () => {
    const exact = extrapolated(trendWait, 30, 60);
    const { averageRunLength, standardError } = simulated(['six-in-a-trend'], 0, 4000);
    expect(Math.abs(averageRunLength - exact)).toBeLessThan(3.5 * standardError);
    expect(standardError / averageRunLength).toBeLessThan(0.02);
  });

  it('is the same for the same seed, and refused for a single run or one without end', () => {
    expect(simulated(['six-in-a-trend'], 0, 50)).toEqual(simulated(['six-in-a-trend'], 0, 50));
    expect(() => simulatedRunLength(() => () => true, 1)).toThrow(RangeError);
    expect(() => simulatedRunLength(() => () => false, 2, 100)).toThrow(RangeError);
  });
});
