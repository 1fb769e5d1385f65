import { describe, expect, it } from 'vitest';
import { completionsAt, type ChartPoint } from '@/lib/control/completions-at';
import { WESTERN_ELECTRIC, type RuleName } from '@/lib/control/rule';
import { standardNormalQuantile } from '@/lib/stats/standard-normal';

const limits = {
  n: 1000,
  level: { centre: 0, sigma: 1, lower: -3, upper: 3 },
  movingRange: { centre: 2 / Math.sqrt(Math.PI), upper: 3 * Math.SQRT2 },
  within: null,
  between: null,
};

const RUNS = 3000;

/** Lengths of runs to the first signal, normal values from a fixed seed (Park and Miller's minimal standard generator). */
function runLengths(rules: readonly RuleName[], shift: number): { mean: number; error: number } {
  let state = 20260;
  const lengths = Array.from({ length: RUNS }, () => {
    const points: ChartPoint[] = [];
    for (;;) {
      state = (state * 16807) % 2147483647;
      const level = shift + standardNormalQuantile(state / 2147483647);
      points.push({ level, within: null, between: null, wafers: 1, movingRange: null, limits, regime: 'a' });
      if (completionsAt(points, points.length - 1, rules).length > 0) return points.length;
    }
  });
  const mean = lengths.reduce((a, b) => a + b) / RUNS;
  const variance = lengths.reduce((sum, x) => sum + (x - mean) ** 2, 0) / (RUNS - 1);
  return { mean, error: Math.sqrt(variance / RUNS) };
}

// C. W. Champ and W. H. Woodall, Technometrics 29, 393 (1987): exact average run lengths, normal, known σ.
describe('points judged by the Western Electric rules run as long to the first signal as Champ and Woodall found', () => {
  it.each<[string, readonly RuleName[], number, number]>([
    ['beyond three sigma alone, in control', ['beyond-3-sigma'], 0, 370.4],
    ['with two of three, in control', ['beyond-3-sigma', 'two-of-three-beyond-2-sigma'], 0, 225.44],
    ['with four of five, in control', ['beyond-3-sigma', 'four-of-five-beyond-1-sigma'], 0, 166.05],
    ['with eight on one side, in control', ['beyond-3-sigma', 'eight-on-one-side'], 0, 152.73],
    ['all four, in control', WESTERN_ELECTRIC, 0, 91.75],
    ['beyond three sigma alone, shifted by one sigma', ['beyond-3-sigma'], 1, 43.89],
    ['all four, shifted by one sigma', WESTERN_ELECTRIC, 1, 9.22],
  ])('%s', (_, rules, shift, published) => {
    const { mean, error } = runLengths(rules, shift);
    expect(Math.abs(mean - published)).toBeLessThan(3.5 * error);
    expect(error / published).toBeLessThan(0.025);
  });
});
