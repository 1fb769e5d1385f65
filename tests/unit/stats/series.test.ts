import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { andersonDarling } from '@/lib/stats/anderson-darling';
import { autocorrelations } from '@/lib/stats/autocorrelations';
import { kthSmallest } from '@/lib/stats/kth-smallest';
import { lagOneLowerBound } from '@/lib/stats/lag-one-autocorrelation';
import { ljungBox } from '@/lib/stats/ljung-box';
import { mannKendall } from '@/lib/stats/mann-kendall';
import { seededRandom } from '@/lib/stats/seeded-random';
import { standardNormalQuantile } from '@/lib/stats/standard-normal';
import { theilSen } from '@/lib/stats/theil-sen';

const places = (n: number): number[] => Array.from({ length: n }, (_, i) => i);
const scores = (n: number): number[] => places(n).map((i) => standardNormalQuantile((i + 0.5) / n));

describe('the Anderson–Darling test of normality', () => {
  it('finds normal scores normal, and an exponential of them not', () => {
    expect(andersonDarling(scores(50))?.p).toBeGreaterThan(0.99);
    expect(andersonDarling(scores(50).map(Math.exp))?.p).toBeLessThan(1e-4);
  });

  it('is 5 % at 0.752 and 1 % at 1.035 (D’Agostino and Stephens 1986, table 4.7, from memory), as often as it says', () => {
    const random = seededRandom('normality');
    const trials = 1500;
    let below = 0;
    for (let i = 0; i < trials; i++) {
      const p = andersonDarling(Array.from({ length: 30 }, () => random.normal()))?.p ?? 0;
      if (p < 0.05) below++;
    }
    expect(Math.abs(below / trials - 0.05)).toBeLessThan(3.5 * Math.sqrt((0.05 * 0.95) / trials));
  });

  it('tells of rounding: how many values are tied, and the step in units of s', () => {
    const rounded = andersonDarling(scores(40).map((x) => Math.round(x * 2) / 2));
    expect(rounded?.tied).toBeGreaterThan(30);
    expect(rounded?.stepInSigma).toBeCloseTo(0.5, 1);
    expect(andersonDarling(scores(40))?.tied).toBe(0);
  });

  it('does not depend on level and unit, and has no answer for few or equal values', () => {
    const plain = andersonDarling(scores(20));
    const moved = andersonDarling(scores(20).map((x) => 1e6 - 3 * x));
    expect(moved?.statistic).toBeCloseTo(plain?.statistic ?? 0, 8);
    expect(andersonDarling(scores(7))).toBeNull();
    expect(andersonDarling(places(20).map(() => 0.1))).toBeNull();
  });

  it('stays finite for a value that no normal distribution holds', () => {
    const wild = andersonDarling([...places(3000).map((i) => i % 2), 1e9]);
    expect(wild?.p).toBeGreaterThan(0);
    expect(wild?.p).toBeLessThan(1e-20);
  });
});

describe('the memory of a series', () => {
  it('is taken off an alternating series by its definition', () => {
    expect(autocorrelations([1, -1, 1, -1], 2)).toEqual([-0.75, 0.5]);
    expect(autocorrelations([5, 5, 5], 1)).toBeNull();
    expect(() => autocorrelations([1, 2], 2)).toThrow(RangeError);
  });

  it('is seen by Ljung and Box in a slow wave, and not tested in nine values', () => {
    expect(ljungBox(places(60).map((i) => Math.sin(i / 5)))?.p).toBeLessThan(1e-10);
    expect(ljungBox(places(9))).toBeNull();
    expect(ljungBox(places(20).map(() => 3))).toBeNull();
  });

  it('has a lower bound that the truth stays above 95 times in 100', () => {
    const random = seededRandom('memory');
    const trials = 1500;
    for (const rho of [0.1, 0.5]) {
      let held = 0;
      for (let i = 0; i < trials; i++) {
        let x = random.normal() / Math.sqrt(1 - rho * rho);
        const series = places(80).map(() => (x = rho * x + random.normal()));
        if (lagOneLowerBound(autocorrelations(series, 1)?.[0] ?? 0, 80) <= rho) held++;
      }
      // The bound is an approximation: within one point of 95 %, and 3.5 standard errors of the simulation.
      expect(Math.abs(held / trials - 0.95)).toBeLessThan(0.01 + 3.5 * Math.sqrt((0.05 * 0.95) / trials));
    }
  });

  it('has a bound within −1 and 1 at the extremes', () => {
    expect(lagOneLowerBound(-1, 20)).toBe(-1);
    expect(lagOneLowerBound(1, 20)).toBeLessThan(1);
    expect(() => lagOneLowerBound(0.2, 5)).toThrow(RangeError);
  });
});

describe('trends', () => {
  it('of four rising values are as rare as two orders of twenty-four', () => {
    expect(mannKendall([1, 2, 3, 4])).toEqual({ s: 6, variance: (4 * 3 * 13) / 18, p: 2 / 24 });
  });

  it('allow for ties: the variance of Kendall 1955, and no answer for equal values', () => {
    const pairs = (m: number): number => m * (m - 1) * (2 * m + 5);
    expect(mannKendall([1, 1, 2, 3, 3, 3, 4])?.variance).toBeCloseTo(
      (pairs(7) - pairs(2) - pairs(3)) / 18,
      12,
    );
    expect(mannKendall([2, 2, 2, 2, 2])).toBeNull();
    expect(mannKendall([1, 2, 3])).toBeNull();
  });

  it('have the slope of a straight line with wild points in it', () => {
    const line = places(21).map((i) => 5 + 0.25 * i);
    line[3] = 1000;
    line[17] = -1000;
    const slope = theilSen(places(21), line);
    expect(slope?.slope).toBeCloseTo(0.25, 12);
    expect(slope?.low).toBeLessThanOrEqual(0.25);
    expect(slope?.high).toBeGreaterThanOrEqual(0.25);
  });

  it('give the example of the docstring', () => {
    expect(theilSen([0, 1, 2, 3, 4], [0, 2, 4, 6, 9])?.slope).toBe(2);
  });

  it('turn with the axis and take the unit of the places', () => {
    const y = [3, 1, 4, 1, 5, 9, 2, 6];
    const hours = y.map((_, i) => 2 * i);
    const [plain, slow, down] = [
      theilSen(places(8), y),
      theilSen(hours, y),
      theilSen(
        places(8),
        y.map((v) => -v),
      ),
    ];
    expect(slow?.slope).toBeCloseTo((plain?.slope ?? 0) / 2, 12);
    expect(down?.slope).toBeCloseTo(-(plain?.slope ?? 0), 12);
    expect(theilSen([1, 1, 1, 1], [1, 2, 3, 4])).toBeNull();
    expect(() => theilSen([2, 1, 3, 4], [1, 2, 3, 4])).toThrow(RangeError);
    expect(() => theilSen([1, 2], [1])).toThrow(RangeError);
  });
});

describe('the k-th smallest value', () => {
  it('is the one that sorting puts there', () => {
    fc.assert(
      fc.property(
        fc.array(fc.integer({ min: -9, max: 9 }), { minLength: 1, maxLength: 50 }),
        fc.nat(),
        (list, n) => {
          const k = n % list.length;
          expect(kthSmallest(Float64Array.from(list), k)).toBe([...list].sort((a, b) => a - b)[k]);
        },
      ),
    );
    expect(() => kthSmallest(Float64Array.of(1), 1)).toThrow(RangeError);
  });
});
