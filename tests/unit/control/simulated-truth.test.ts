import { describe, expect, it } from 'vitest';
import { MEMORY_BEGIN, memorySignals, nextMemory } from '@/lib/control/chart-memory';
import { chartRunLength, type ChartDesign } from '@/lib/control/chart-run-length';
import { conditionalRate } from '@/lib/control/conditional-rate';
import { limitSet } from '@/lib/control/limit-set';
import { MEAN_RANGE_OF_TWO, MOVING_RANGE_CLASSICAL } from '@/lib/control/moving-range-factors';
import { WESTERN_ELECTRIC } from '@/lib/control/rule';
import { ruleWalk } from '@/lib/control/rule-walk';
import { simulatedRunLength } from '@/lib/control/simulated-run-length';
import { rangeLaw, spreadLimits, standardDeviationLaw, type SpreadLaw } from '@/lib/control/spread-law';
import { chiSquareCdf } from '@/lib/stats/chi-square';
import { rangeCdf } from '@/lib/stats/range-distribution';
import { sampleStandardDeviation } from '@/lib/stats/sample-standard-deviation';
import { seededRandom } from '@/lib/stats/seeded-random';
import { standardNormalCdf } from '@/lib/stats/standard-normal';
import { unitLimits } from './chart-points';

const FOUR = { kind: 'rules', rules: WESTERN_ELECTRIC } as const;

const STREAMS = 10_000;

/** Runs of charts with memory or rules on values with mean `shift` and σ 1, limits known. */
function runsOf(design: ChartDesign, shift: number, seed: string): () => () => boolean {
  const source = seededRandom(seed);
  const walk = design.kind === 'rules' ? ruleWalk(design.rules) : null;
  const designs = {
    ewma: design.kind === 'ewma' ? design : null,
    cusum: design.kind === 'cusum' ? design : null,
  };
  return () => {
    walk?.restart();
    let memory = MEMORY_BEGIN;
    return () => {
      const level = shift + source.normal();
      if (walk) return walk.signals(level);
      memory = nextMemory(memory, { level, limits: unitLimits, regime: 'a' }, designs);
      return memorySignals(memory, designs).length > 0;
    };
  };
}

describe('ten thousand streams of chance run as long to the first signal as computed', () => {
  it.each<[string, ChartDesign, number]>([
    ['the four rules, in control', { kind: 'rules', rules: WESTERN_ELECTRIC }, 0],
    ['the four rules, shifted', { kind: 'rules', rules: WESTERN_ELECTRIC }, 0.8],
    ['an EWMA, in control', { kind: 'ewma', lambda: 0.2, width: 2.4 }, 0],
    ['an EWMA, shifted', { kind: 'ewma', lambda: 0.1, width: 2.814 }, 1],
    ['a CUSUM, in control', { kind: 'cusum', reference: 0.5, decision: 3.5 }, 0],
    ['a CUSUM, shifted', { kind: 'cusum', reference: 0.5, decision: 5 }, -1],
  ])('%s', (name, design, shift) => {
    const { averageRunLength, standardError } = simulatedRunLength(runsOf(design, shift, name), STREAMS);
    const computed = chartRunLength(design, { shift });
    expect(Math.abs(averageRunLength - computed)).toBeLessThan(3.5 * standardError);
    expect(standardError / computed).toBeLessThan(0.012);
  });

  it('a CUSUM whose shift comes after sixty points without a signal', () => {
    const design = { kind: 'cusum', reference: 0.5, decision: 4 } as const;
    const source = seededRandom('steady');
    const designs = { ewma: null, cusum: design };
    const step = (memory: typeof MEMORY_BEGIN, level: number) =>
      nextMemory(memory, { level, limits: unitLimits, regime: 'a' }, designs);
    const standing = (): typeof MEMORY_BEGIN => {
      let memory = MEMORY_BEGIN;
      for (let i = 0; i < 60; i++) {
        memory = step(memory, source.normal());
        if (memorySignals(memory, designs).length > 0) return standing();
      }
      return memory;
    };
    const { averageRunLength, standardError } = simulatedRunLength(() => {
      let memory = standing();
      return () => {
        memory = step(memory, 1 + source.normal());
        return memorySignals(memory, designs).length > 0;
      };
    }, 5000);
    const computed = chartRunLength(design, { shift: 1, start: 'steady' });
    expect(Math.abs(averageRunLength - computed)).toBeLessThan(3.5 * standardError);
  });
});

/** The share of `count` draws that are out, with its standard error at the computed share. */
function outShare(count: number, isOut: () => boolean, computed: number): { share: number; error: number } {
  let out = 0;
  for (let i = 0; i < count; i++) if (isOut()) out++;
  return { share: out / count, error: Math.sqrt((computed * (1 - computed)) / count) };
}

describe('points of chance lie beyond their limits as often as computed', () => {
  const source = seededRandom('limits');
  const group = (n: number) => Array.from({ length: n }, () => source.normal());
  const below: Record<SpreadLaw['name'], (value: number, n: number) => number> = {
    range: rangeCdf,
    s: (value, n) => chiSquareCdf(value * value * (n - 1), n - 1),
  };

  it.each<['range' | 's', number, 'classical' | 'probability']>([
    ['range', 2, 'classical'],
    ['range', 5, 'classical'],
    ['range', 5, 'probability'],
    ['s', 4, 'classical'],
    ['s', 9, 'probability'],
  ])('%s of %d, %s', (name, n, kind) => {
    const law: SpreadLaw = name === 's' ? standardDeviationLaw : rangeLaw;
    const { lower, upper } = spreadLimits(law, n, 1, kind);
    const computed = 1 - below[law.name](upper, n) + (lower > 0 ? below[law.name](lower, n) : 0);
    if (kind === 'probability') expect(computed).toBeCloseTo(0.0027, 6);
    const isOut = () => {
      const values = group(n);
      const value = law.name === 's' ? (sampleStandardDeviation(values) ?? 0) : (law.of(values) ?? 0);
      return value > upper || value < lower;
    };
    const { share, error } = outShare(20_000, isOut, computed);
    expect(Math.abs(share - computed)).toBeLessThan(3.5 * error);
  });

  it('the classical moving range: 0.92 % where 0.27 % is meant', () => {
    const upper = MOVING_RANGE_CLASSICAL * MEAN_RANGE_OF_TWO;
    const computed = 2 * standardNormalCdf(-upper / Math.SQRT2);
    expect(computed).toBeCloseTo(0.0092, 4);
    const isOut = () => Math.abs(source.normal() - source.normal()) > upper;
    const { share, error } = outShare(100_000, isOut, computed);
    expect(Math.abs(share - computed)).toBeLessThan(3.5 * error);
  });

  it('with limits estimated from 25 points: the rate in the mean over baselines', () => {
    const walk = ruleWalk(WESTERN_ELECTRIC);
    const points = 1000;
    const rates = Array.from({ length: 300 }, () => {
      const baseline = group(25).map((level) => ({ level, within: null, between: null, wafers: 1 }));
      const { centre, sigma } = limitSet(baseline).level;
      let signals = 0;
      walk.restart();
      for (let i = 0; i < points; i++) {
        if (!walk.signals((source.normal() - centre) / sigma)) continue;
        signals++;
        walk.restart();
      }
      return signals / points;
    });
    const mean = rates.reduce((a, b) => a + b) / rates.length;
    const variance = rates.reduce((sum, rate) => sum + (rate - mean) ** 2, 0) / (rates.length - 1);
    const { perPoint } = conditionalRate(FOUR, 25, seededRandom('estimated'), {
      baselines: 4000,
    });
    // Both are samples of baselines: 300 here, 1500 there.
    const error = Math.sqrt(variance / rates.length + variance / 1500);
    expect(Math.abs(mean - perPoint)).toBeLessThan(3.5 * error);
  });
});
