import { describe, expect, it } from 'vitest';
import { allowedOnsets } from '@/lib/control/allowed-onsets';
import { onset } from '@/lib/control/onset';
import { onsetRatios } from '@/lib/control/onset-ratios';
import { seededRandom } from '@/lib/stats/seeded-random';
import { standardNormalQuantile } from '@/lib/stats/standard-normal';

const PLAIN = { centre: 0, sigma: 1 };
const quiet = Array.from({ length: 30 }, (_, i) => standardNormalQuantile((((i * 7) % 30) + 0.5) / 30));

describe('the ratios of an onset', () => {
  it('are those of the definitions: (T − τ)·(mean after τ)² and the sloped sum, by another way', () => {
    const z = [0.3, -1, 0.2, 1.5, 2, 1.1];
    const step = onsetRatios(z, 'step');
    const drift = onsetRatios(z, 'drift');
    z.forEach((_, t) => {
      const after = z.slice(t);
      const mean = after.reduce((sum, x) => sum + x, 0) / after.length;
      expect(step.ratios[t]).toBeCloseTo(after.length * mean ** 2, 12);
      const sloped = after.reduce((sum, x, i) => sum + (i + 1) * x, 0);
      const squares = after.reduce((sum, _x, i) => sum + (i + 1) ** 2, 0);
      expect(drift.ratios[t]).toBeCloseTo(sloped ** 2 / squares, 12);
      expect(drift.sizes[t]).toBeCloseTo(sloped / squares, 12);
    });
  });
});

describe('since when', () => {
  it('places a large step at its very point, with its size', () => {
    const values = quiet.map((x, i) => 100 + 2 * (x + (i < 18 ? 0 : 8)));
    const found = onset(values, { centre: 100, sigma: 2 }, 'step', seededRandom('step'));
    expect(found.first).toBe(18);
    expect(found.set).toContain(18);
    expect(found.set.length).toBeLessThanOrEqual(3);
    expect(found.size).toBeGreaterThan(13);
    expect(found.size).toBeLessThan(19);
  });

  it('places a drift about where it began, and gives its slope per point', () => {
    const values = quiet.map((x, i) => x + (i < 12 ? 0 : 0.5 * (i - 11)));
    const found = onset(values, PLAIN, 'drift', seededRandom('drift'));
    expect(Math.abs(found.first - 12)).toBeLessThanOrEqual(2);
    expect(found.set).toContain(12);
    expect(found.size).toBeCloseTo(0.5, 1);
  });

  it('is the same for the same seed, falls with the values, and allows most points where nothing changed', () => {
    const values = quiet.map((x, i) => x + (i < 20 ? 0 : 1));
    const found = onset(values, PLAIN, 'step', seededRandom('a'));
    expect(onset(values, PLAIN, 'step', seededRandom('a'))).toEqual(found);
    const down = onset(
      values.map((x) => -x),
      PLAIN,
      'step',
      seededRandom('a'),
    );
    expect([down.first, down.size]).toEqual([found.first, -found.size]);
    expect(onset(quiet, PLAIN, 'step', seededRandom('a')).set.length).toBeGreaterThan(20);
  });

  it('allows the true point as often as it says, also when a point beyond 3 σ ended the series', () => {
    const random = seededRandom('coverage of the onset');
    const trials = 150;
    const slack = 0.01 + 3.5 * Math.sqrt((0.05 * 0.95) / trials);
    const allows = (
      values: readonly number[],
      t: number,
      shape: 'step' | 'drift',
      held: number[],
    ): boolean => {
      const z = Float64Array.from(values);
      const found = onsetRatios(z, shape);
      const noise = Array.from({ length: 200 }, () => Float64Array.from(z, () => random.normal()));
      const question = { ...found, z, shape, noise, held: new Set(held), part: 0.05 };
      return found.ratios.indexOf(Math.max(...found.ratios)) === t || allowedOnsets(question)(t);
    };
    let plain = 0;
    let drifting = 0;
    let stopped = 0;
    for (let i = 0; i < trials; i++) {
      const noise = Array.from({ length: 40 }, () => random.normal());
      const step = noise.map((x, k) => x + (k < 25 ? 0 : 1));
      const drift = noise.map((x, k) => x + (k < 25 ? 0 : 0.15 * (k - 24)));
      if (allows(step, 25, 'step', [])) plain++;
      if (allows(drift, 25, 'drift', [])) drifting++;
      const quietly = noise.slice(0, 20).map((x) => (Math.abs(x) > 3 ? 0 : x));
      do quietly.push(random.normal() + 1.5);
      while (Math.abs(quietly.at(-1) ?? 0) <= 3);
      if (allows(quietly, 20, 'step', [quietly.length - 1])) stopped++;
    }
    for (const held of [plain, drifting]) expect(Math.abs(held / trials - 0.95)).toBeLessThan(slack);
    // After a signal the set is a little wide: it holds the truth at least as often as it says.
    expect(stopped / trials).toBeGreaterThan(0.95 - slack);
  });

  it('refuses one value, values that are not finite, and a σ or confidence that is none', () => {
    const random = seededRandom('x');
    expect(() => onset([1], PLAIN, 'step', random)).toThrow(RangeError);
    expect(() => onset([1, NaN], PLAIN, 'step', random)).toThrow(RangeError);
    expect(() => onset([1, 2], { centre: 0, sigma: 0 }, 'step', random)).toThrow(RangeError);
    expect(() => onset([1, 2], PLAIN, 'step', random, { confidence: 1 })).toThrow(RangeError);
    expect(() => onset([1, 2], PLAIN, 'step', random, { replicates: 10 })).toThrow(RangeError);
  });
});
