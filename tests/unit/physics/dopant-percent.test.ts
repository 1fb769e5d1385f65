import { describe, expect, it } from 'vitest';
import { densitySensitivity } from '@/lib/physics/density-sensitivity';
import { dopantPercent } from '@/lib/physics/dopant-percent';
import { modelValue } from '@/lib/physics/model-value';
import { uniformBoron as target } from '../../support/uniform-boron';

describe('a difference of readings as percent dopant', () => {
  it('is nothing where there is none, and more dopant where the reading is lower', () => {
    expect(dopantPercent(1, -0.98)).toBe(0);
    expect(dopantPercent(0.98, -1)).toBeCloseTo(100 / 0.98 - 100, 12);
  });

  it('agrees with the conversion itself over some percent', () => {
    for (const density of [1e14, 1e15, 1e17]) {
      const sensitivity = densitySensitivity(target, density);
      for (const percent of [-5, -1, 2, 5]) {
        const ratio = modelValue(target, density * (1 + percent / 100)) / modelValue(target, density);
        expect(Math.abs((dopantPercent(ratio, sensitivity) ?? 0) - percent)).toBeLessThan(0.05);
      }
    }
  });

  it('is null where the answer is no number any more, and refuses what is no ratio', () => {
    expect(dopantPercent(1e300, 0.1)).toBeNull();
    expect(() => dopantPercent(0, -1)).toThrow(RangeError);
    expect(() => dopantPercent(Number.NaN, -1)).toThrow(RangeError);
    expect(() => dopantPercent(1, 0)).toThrow(RangeError);
  });
});
