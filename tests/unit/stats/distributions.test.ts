import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { c4 } from '@/lib/stats/c4';
import { chiSquareCdf, chiSquareQuantile } from '@/lib/stats/chi-square';
import { logGamma } from '@/lib/stats/log-gamma';
import { rangeCdf, rangeConstants, rangeQuantile } from '@/lib/stats/range-distribution';
import { standardNormalCdf, standardNormalQuantile } from '@/lib/stats/standard-normal';

describe('the standard normal distribution', () => {
  it('agrees with the table of Abramowitz and Stegun (26.1, from memory) to its fifteen digits', () => {
    expect(standardNormalCdf(1)).toBeCloseTo(0.841344746068543, 14);
    expect(standardNormalCdf(2)).toBeCloseTo(0.977249868051821, 14);
    expect(standardNormalCdf(3)).toBeCloseTo(0.99865010196837, 14);
    expect(standardNormalCdf(-5) / 2.866515719e-7).toBeCloseTo(1, 9);
  });

  it('has its quantiles to 1e-9 (16-digit values from memory)', () => {
    expect(standardNormalQuantile(0.975)).toBeCloseTo(1.959963984540054, 12);
    expect(standardNormalQuantile(0.75)).toBeCloseTo(0.6744897501960817, 12);
    expect(standardNormalQuantile(0.5)).toBe(0);
  });

  it('comes back from its own inverse, far into both tails', () => {
    fc.assert(
      fc.property(fc.double({ min: -8, max: 8, noNaN: true }), (z) => {
        const lower = -Math.abs(z);
        if (z !== 0) expect(standardNormalQuantile(standardNormalCdf(lower))).toBeCloseTo(lower, 9);
        expect(standardNormalCdf(z) + standardNormalCdf(-z)).toBeCloseTo(1, 14);
      }),
    );
  });

  it('refuses what is no probability and what is not finite', () => {
    for (const p of [0, 1, -0.1, NaN]) expect(() => standardNormalQuantile(p)).toThrow(RangeError);
    expect(() => standardNormalCdf(NaN)).toThrow(RangeError);
  });
});

describe('the log-gamma function', () => {
  it('is the logarithm of factorials and of √π at ½', () => {
    expect(logGamma(5)).toBeCloseTo(Math.log(24), 9);
    expect(logGamma(0.5)).toBeCloseTo(Math.log(Math.PI) / 2, 9);
    expect(() => logGamma(0)).toThrow(RangeError);
  });
});

describe('the chi-square distribution', () => {
  it('agrees with the table of the NIST/SEMATECH e-Handbook, section 1.3.6.7.4 (from memory)', () => {
    expect(chiSquareQuantile(0.95, 1)).toBeCloseTo(3.841, 3);
    expect(chiSquareQuantile(0.99, 10)).toBeCloseTo(23.209, 3);
    expect(chiSquareQuantile(0.05, 10)).toBeCloseTo(3.94, 3);
    expect(chiSquareQuantile(0.95, 100)).toBeCloseTo(124.342, 3);
  });

  it('is an exponential with two degrees of freedom and a squared normal with one', () => {
    for (const x of [0.01, 0.5, 2, 9, 30]) {
      expect(chiSquareCdf(x, 2)).toBeCloseTo(1 - Math.exp(-x / 2), 9);
      expect(chiSquareCdf(x, 1)).toBeCloseTo(2 * standardNormalCdf(Math.sqrt(x)) - 1, 9);
    }
  });

  it('comes back from its own inverse', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.001, max: 0.999, noNaN: true }),
        fc.integer({ min: 1, max: 300 }),
        (p, df) => {
          expect(chiSquareCdf(chiSquareQuantile(p, df), df)).toBeCloseTo(p, 8);
        },
      ),
    );
    expect(() => chiSquareQuantile(0.5, 0)).toThrow(RangeError);
  });
});

describe('the range of normal values', () => {
  it('of two has d2 = 2/√π and d3² = 2 − 4/π', () => {
    expect(rangeConstants(2).d2).toBeCloseTo(2 / Math.sqrt(Math.PI), 7);
    expect(rangeConstants(2).d3).toBeCloseTo(Math.sqrt(2 - 4 / Math.PI), 7);
  });

  it('of two is a half-normal with σ√2', () => {
    for (const w of [0.3, 1, 2.5, 4]) {
      expect(rangeCdf(w, 2)).toBeCloseTo(2 * standardNormalCdf(w / Math.SQRT2) - 1, 9);
    }
  });

  it('of ten has the studentized range 4.474 at 95 % with infinite degrees of freedom (Pearson and Hartley, from memory)', () => {
    expect(rangeQuantile(0.95, 10)).toBeCloseTo(4.474, 3);
  });

  it('refuses fewer than two values', () => {
    for (const n of [1, 0, 2.5, NaN]) {
      expect(() => rangeConstants(n)).toThrow(RangeError);
      expect(() => c4(n)).toThrow(RangeError);
    }
  });
});
