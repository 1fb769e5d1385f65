import { describe, expect, it } from 'vitest';
import { capability } from '@/lib/control/capability';
import { distanceIndexInterval, spreadIndexInterval } from '@/lib/control/capability-interval';
import { percentileCapability } from '@/lib/control/percentile-capability';
import { sigmaEstimate } from '@/lib/control/sigma-estimate';
import { signallingPoints } from '@/lib/control/signalling-points';
import { seededRandom } from '@/lib/stats/seeded-random';
import { standardNormalQuantile } from '@/lib/stats/standard-normal';

/** Values in an order without pattern, with the given mean and s. */
function sample(n: number, mean: number, s: number): number[][] {
  const plain = Array.from({ length: n }, (_, i) => standardNormalQuantile((((i * 17) % n) + 0.5) / n));
  const scale = s / Math.sqrt(plain.reduce((sum, x) => sum + x * x, 0) / (n - 1));
  return plain.map((x) => [mean + scale * x]);
}

describe('capability', () => {
  it('is Cp 1.0 and Cpk 0.6667 for limits 8 and 20, mean 16, s 2 (NIST/SEMATECH e-Handbook, 6.1.6, from memory)', () => {
    const found = capability(sample(50, 16, 2), { lower: 8, upper: 20, target: 14 });
    expect(found?.cp?.value).toBeCloseTo(1, 10);
    expect(found?.cpk?.value).toBeCloseTo(0.6667, 4);
    expect(found?.cpm?.value).toBeCloseTo(12 / (6 * Math.sqrt(8)), 10);
    expect(found?.signals).toBe(0);
  });

  it('has no index below thirty values, without spread, and with one limit only those that one limit gives', () => {
    const spec = { lower: null, upper: 20, target: 14 };
    expect(capability(sample(29, 16, 2), spec)).toBeNull();
    expect(capability(sample(40, 16, 0), spec)).toBeNull();
    const found = capability(sample(40, 16, 2), spec);
    expect([found?.cp, found?.pp, found?.cpm]).toEqual([null, null, null]);
    expect(found?.ppk?.value).toBeCloseTo(4 / 6, 10);
  });

  it('is below zero for a mean beyond the limit', () => {
    const ppk = capability(sample(40, 21, 2), { lower: null, upper: 20, target: null })?.ppk;
    expect(ppk?.value).toBeCloseTo(-1 / 6, 10);
    expect(ppk?.interval.low).toBeLessThan(-1 / 6);
  });

  it('counts the points that signal, and so tells an unstable process', () => {
    const steady = sample(40, 10, 1).flat();
    expect(signallingPoints(steady)).toBe(0);
    expect(signallingPoints([...steady, ...steady.map((x) => x + 4)])).toBeGreaterThan(5);
    expect(signallingPoints([1])).toBe(0);
  });

  it('refuses no limit, limits in the wrong order and numbers that are not finite', () => {
    const values = sample(40, 10, 1);
    for (const [lower, upper] of [
      [null, null],
      [2, 1],
      [NaN, 1],
      [1, 1],
    ] as const) {
      expect(() => capability(values, { lower, upper, target: null })).toThrow(RangeError);
    }
    expect(() => capability([...values, [NaN]], { lower: 0, upper: 1, target: null })).toThrow(RangeError);
  });
});

describe('σ and its degrees of freedom', () => {
  it('of a mean moving range are about 0.61·(n − 1)', () => {
    const freedom = sigmaEstimate(sample(200, 0, 1), 'mean-moving-range')?.degreesOfFreedom ?? 0;
    expect(freedom / 199).toBeCloseTo(0.61, 2);
  });

  it('of a mean range of subgroups of five are those of the tables: 3.83 each, 18.4 of five (A. J. Duncan, from memory)', () => {
    const groups = Array.from({ length: 5 }, (_, i) => [i, i + 1, i + 2, i - 1, i]);
    expect(Math.abs((sigmaEstimate(groups, 'mean-range')?.degreesOfFreedom ?? 0) - 18.4)).toBeLessThan(0.1);
    expect(
      Math.abs((sigmaEstimate(groups.slice(1, 2), 'mean-range')?.degreesOfFreedom ?? 0) - 3.83),
    ).toBeLessThan(0.1);
  });

  it('are those of the subgroups when pooled, and null where there is no spread to take', () => {
    expect(sigmaEstimate([[1, 3], [5], [1, 2, 3]], 'pooled-s')).toMatchObject({ degreesOfFreedom: 3 });
    expect(sigmaEstimate([[1, 3], [5], [1, 2, 3]], 'pooled-s')?.sigma).toBeCloseTo(Math.sqrt(4 / 3), 12);
    for (const name of ['overall-s', 'mean-moving-range', 'pooled-s', 'mean-range'] as const) {
      expect(sigmaEstimate([[1]], name)).toBeNull();
    }
    expect(() => sigmaEstimate([[1, 2]], 'mean-moving-range')).toThrow(RangeError);
    expect(sigmaEstimate([[1], [3], [1], [3]], 'mean-moving-range')?.sigma).toBeCloseTo(
      Math.sqrt(Math.PI),
      12,
    );
  });
});

describe('intervals of capability', () => {
  it('of Cp are chi-square: 31.555 and 70.222 over 49 (table of the e-Handbook, 1.3.6.7.4, from memory)', () => {
    const { low, high } = spreadIndexInterval(1, 49);
    expect(low).toBeCloseTo(Math.sqrt(31.555 / 49), 4);
    expect(high).toBeCloseTo(Math.sqrt(70.222 / 49), 4);
  });

  it('of Cpk go over into the normal form where there are many values', () => {
    const exact = distanceIndexInterval(1.33, 2000, 1999);
    const normal = distanceIndexInterval(1.33, 2002, 2001);
    expect(exact.low).toBeCloseTo(normal.low, 3);
    expect(exact.high).toBeCloseTo(normal.high, 3);
  });

  it('hold the truth as often as they say, within 94 and 96 % and 3.5 standard errors of the simulation', () => {
    const random = seededRandom('capability');
    const trials = 120;
    const [lower, upper, target] = [-6, 3.5, -0.5];
    const truth = { cp: 9.5 / 6, cpk: 3.5 / 3, pp: 9.5 / 6, ppk: 3.5 / 3, cpm: 9.5 / 6 / Math.hypot(1, 0.5) };
    const names = ['cp', 'cpk', 'pp', 'ppk', 'cpm'] as const;
    const held = new Map<string, number>();
    for (let i = 0; i < trials; i++) {
      const values = Array.from({ length: 40 }, () => [random.normal()]);
      const found = capability(values, { lower, upper, target }, { estimator: 'mean-moving-range' });
      for (const name of names) {
        const { low, high } = found?.[name]?.interval ?? { low: NaN, high: NaN };
        if (low <= truth[name] && truth[name] <= high) held.set(name, (held.get(name) ?? 0) + 1);
      }
    }
    const slack = 0.01 + 3.5 * Math.sqrt((0.05 * 0.95) / trials);
    for (const name of names)
      expect(Math.abs((held.get(name) ?? 0) / trials - 0.95), name).toBeLessThan(slack);
  });
});

describe('the percentile method', () => {
  it('puts a lognormal figure with the limit at its 99.865 % point at Ppk 1, whatever its scale', () => {
    const logs = sample(100, 0.4, 0.25).flat();
    const upper = Math.exp(0.4 + 3 * 0.25);
    for (const scale of [1, 1000]) {
      const values = logs.map((x) => scale * Math.exp(x));
      const found = percentileCapability(values, { lower: null, upper: scale * upper });
      expect(found?.ppk.value).toBeCloseTo(1, 10);
      expect(found?.pp).toBeNull();
    }
  });

  it('is the plain one where there is little skew', () => {
    const values = sample(200, 1000, 1).flat();
    const found = percentileCapability(values, { lower: 996, upper: 1005 });
    expect(found?.pp?.value).toBeCloseTo(9 / 6, 2);
    expect(found?.ppk.value).toBeCloseTo(4 / 3, 2);
    expect(found?.ppk.interval.low).toBeCloseTo(distanceIndexInterval(4 / 3, 200, 199).low, 1);
  });

  it('takes values above zero only, and has no answer for equal ones', () => {
    expect(() => percentileCapability([1, 0], { lower: null, upper: 2 })).toThrow(RangeError);
    expect(() => percentileCapability([1, 2], { lower: null, upper: null })).toThrow(RangeError);
    expect(percentileCapability([1, 1], { lower: null, upper: 2 })).toBeNull();
  });
});
