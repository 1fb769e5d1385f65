import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { lagOneAutocorrelation } from '@/lib/stats/lag-one-autocorrelation';
import { mean } from '@/lib/stats/mean';
import { median } from '@/lib/stats/median';
import { medianAbsoluteDeviation } from '@/lib/stats/median-absolute-deviation';
import { quantile } from '@/lib/stats/quantile';
import { sampleStandardDeviation } from '@/lib/stats/sample-standard-deviation';

const value = fc.double({ min: -1e6, max: 1e6, noNaN: true });
const sample = fc.array(value, { minLength: 2, maxLength: 60 });

describe('summaries of a sample', () => {
  it('refuse an empty sample and any value that is not finite', () => {
    const functions = [mean, median, medianAbsoluteDeviation, sampleStandardDeviation, lagOneAutocorrelation];
    for (const summary of functions) {
      expect(() => summary([])).toThrow(RangeError);
      for (const bad of [NaN, Infinity, -Infinity]) expect(() => summary([1, bad, 3])).toThrow(RangeError);
    }
    expect(() => quantile([], 0.5)).toThrow(RangeError);
    expect(() => quantile([1, NaN], 0.5)).toThrow(RangeError);
    expect(() => quantile([1, 2], 1.1)).toThrow(RangeError);
  });

  it('give the examples of their docstrings (computed by their definitions)', () => {
    expect(mean([1, 2, 6])).toBe(3);
    expect(sampleStandardDeviation([1, 2, 3])).toBe(1);
    expect(median([5, 1, 9])).toBe(5);
    expect(quantile([1, 2, 3, 4, 5], 0.25)).toBe(2);
    // 1.4826: P. J. Rousseeuw and C. Croux, J. American Statistical Association 88, 1273 (1993).
    expect(medianAbsoluteDeviation([1, 2, 3, 4, 100])).toBeCloseTo(1.4826, 4);
  });

  it('have no spread of one value, and none of equal values however far from zero', () => {
    expect(sampleStandardDeviation([7])).toBeNull();
    expect(lagOneAutocorrelation([7])).toBeNull();
    for (const level of [0, 0.1, 1e15 + 1, -3e-300]) {
      const equal = [level, level, level, level, level, level, level];
      expect(mean(equal)).toBe(level);
      expect(sampleStandardDeviation(equal)).toBe(0);
      expect(lagOneAutocorrelation(equal)).toBeNull();
    }
  });

  it('keep their digits on a huge offset', () => {
    for (const offset of [1e9, 1e12, 1e15]) {
      const shifted = [1, 2, 3, 4, 5].map((x) => x + offset);
      expect(mean(shifted)).toBe(offset + 3);
      expect(sampleStandardDeviation(shifted)).toBeCloseTo(Math.sqrt(2.5), 12);
    }
  });

  it('read a narrow spread as the decimals that were written', () => {
    expect(sampleStandardDeviation([10000000.1, 10000000.3])).toBeCloseTo(0.2 / Math.SQRT2, 12);
  });

  it('shift and scale with the sample', () => {
    fc.assert(
      fc.property(sample, fc.double({ min: -100, max: 100, noNaN: true }), (values, shift) => {
        const s = sampleStandardDeviation(values) ?? 0;
        const moved = values.map((x) => -2 * x + shift);
        expect(sampleStandardDeviation(moved)).toBeCloseTo(2 * s, 5);
        expect(mean(moved)).toBeCloseTo(-2 * mean(values) + shift, 5);
        expect(median(moved)).toBeCloseTo(-2 * median(values) + shift, 5);
        expect(medianAbsoluteDeviation(moved)).toBeCloseTo(2 * medianAbsoluteDeviation(values), 5);
      }),
    );
  });

  it('do not depend on the order, and leave the sample as it was', () => {
    fc.assert(
      fc.property(sample, (values) => {
        const before = [...values];
        const reversed = [...values].reverse();
        expect(median(values)).toBe(median(reversed));
        expect(quantile(values, 0.3)).toBe(quantile(reversed, 0.3));
        expect(values).toEqual(before);
      }),
    );
  });

  it('put the extremes at the quantiles 0 and 1 and the median at ½', () => {
    fc.assert(
      fc.property(sample, (values) => {
        expect(quantile(values, 0)).toBe(Math.min(...values) + 0);
        expect(quantile(values, 1)).toBe(Math.max(...values) + 0);
        expect(quantile(values, 0.5)).toBeCloseTo(median(values), 6);
      }),
      { examples: [[[-0, 1]], [[-1, -0]], [[-0, -0]]] },
    );
  });
});
