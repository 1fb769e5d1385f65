import { describe, expect, it } from 'vitest';
import { baselineStudy } from '@/lib/control/baseline-study';
import { seededRandom } from '@/lib/stats/seeded-random';

const subgroups = (levels: readonly number[]) =>
  levels.map((level) => ({ level, within: null, between: null, wafers: 1 }));

/** A seeded first-order autoregressive series with σ = 1 and one wild point. */
function series(phi: number, n: number, wild?: number): number[] {
  const random = seededRandom(`baseline ${phi}`);
  let x = random.normal();
  const levels = Array.from({ length: n }, () => (x = phi * x + Math.sqrt(1 - phi * phi) * random.normal()));
  if (wild !== undefined) levels[wild] = 12;
  return levels;
}

describe('the study of a baseline', () => {
  it('lets limits from moving ranges stand where levels are independent', () => {
    const found = baselineStudy(subgroups(series(0, 120)));
    expect(found.movingRangesStand).toBe(true);
    expect(found.age).toBe('established');
    expect(found.normality?.p).toBeGreaterThan(0.01);
    expect(found.memory?.ljungBox?.p).toBeGreaterThan(0.01);
  });

  it('refuses them where each level follows the one before, and offers what is wide enough', () => {
    const found = baselineStudy(subgroups(series(0.7, 200)));
    expect(found.movingRangesStand).toBe(false);
    expect(found.memory?.lowerBound).toBeGreaterThan(0.1);
    // Moving ranges see σ·√(1 − φ) of independent values: 0.55 σ here; the long run sees σ.
    expect(found.limits.level.sigma).toBeLessThan(0.65);
    expect(Math.abs((found.longRun?.sigma ?? 0) - 1)).toBeLessThan(3.5 * Math.sqrt(5.7 / 400));
    expect(Math.abs((found.autoregression?.phi ?? 0) - 0.7)).toBeLessThan(3.5 * Math.sqrt(0.51 / 200));
    const { phi, sigma } = found.autoregression ?? { phi: 0, sigma: 0 };
    expect(sigma).toBeCloseTo((found.longRun?.sigma ?? 0) * Math.sqrt(1 - phi ** 2), 12);
  });

  it('names the points beyond the candidate limits', () => {
    expect(baselineStudy(subgroups(series(0, 60, 17))).beyond).toEqual([17]);
  });

  it('has nothing to say on few subgroups or equal levels', () => {
    const few = baselineStudy(subgroups([1, 2, 3, 4, 5]));
    expect(few).toMatchObject({
      normality: null,
      memory: null,
      movingRangesStand: true,
      autoregression: null,
    });
    const equal = baselineStudy(subgroups(Array.from({ length: 30 }, () => 2)));
    expect(equal).toMatchObject({
      normality: null,
      memory: null,
      longRun: null,
      autoregression: null,
      beyond: [],
    });
    expect(() => baselineStudy(subgroups([1]))).toThrow(RangeError);
  });
});
