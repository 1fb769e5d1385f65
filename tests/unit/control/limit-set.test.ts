import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { limitAge, limitInterval, limitSet, type SubgroupPoint } from '@/lib/control/limit-set';
import { movingSigmaVariance } from '@/lib/control/limit-interval';
import { standardNormalQuantile } from '@/lib/stats/standard-normal';

const single = (level: number): SubgroupPoint => ({ level, within: null, between: null, wafers: 1 });

/** Normal values from a fixed seed: the minimal standard generator of Park and Miller, Comm. ACM 31, 1192 (1988). */
function normals(count: number, seed: number): number[] {
  let state = seed;
  return Array.from({ length: count }, () => {
    state = (state * 16807) % 2147483647;
    return standardNormalQuantile(state / 2147483647);
  });
}

describe('a limit set', () => {
  it('needs two subgroups and finite values', () => {
    expect(() => limitSet([])).toThrow(RangeError);
    expect(() => limitSet([single(1)])).toThrow(RangeError);
    expect(() => limitSet([single(1), single(NaN)])).toThrow(RangeError);
    expect(() => limitSet([single(1), { ...single(2), within: -1 }])).toThrow(RangeError);
    expect(() => limitSet([single(1), { ...single(2), between: NaN, wafers: 2 }])).toThrow(RangeError);
  });

  it('of two subgroups stands on their one moving range', () => {
    const { level, movingRange, within, between, n } = limitSet([single(1), single(2)]);
    expect({ n, within, between }).toEqual({ n: 2, within: null, between: null });
    expect(level.centre).toBe(1.5);
    expect(level.sigma).toBeCloseTo(Math.sqrt(Math.PI) / 2, 12);
    expect(movingRange.centre).toBe(1);
  });

  it('has no width when all are equal, even far from zero', () => {
    const { level } = limitSet([1e9 + 0.1, 1e9 + 0.1, 1e9 + 0.1].map(single));
    expect(level).toEqual({ centre: 1e9 + 0.1, sigma: 0, lower: 1e9 + 0.1, upper: 1e9 + 0.1 });
  });

  it('limits a moving range at 3.760 times its mean, or classically at 3.267 (ASTM MNL7, D4)', () => {
    const baseline = [0, 1, 0, 1].map(single);
    expect(limitSet(baseline).movingRange.upper).toBeCloseTo(3.76, 3);
    expect(limitSet(baseline, { movingRange: 'classical' }).movingRange.upper).toBeCloseTo(3.267, 3);
  });

  it('puts the live limit of a moving range at the 0.9973 quantile of a half-normal', () => {
    const beyond = standardNormalQuantile(1 - 0.0027 / 2) * Math.SQRT2;
    expect(limitSet([0, 1].map(single)).movingRange.upper * (2 / Math.sqrt(Math.PI))).toBeCloseTo(beyond, 3);
  });

  it('limits the spread within on its logarithm, leaving zeros out', () => {
    const spread = (within: number | null) => ({ ...single(1), within });
    const within = limitSet([1, Math.E, 0, null].map(spread)).within;
    expect(within?.centre).toBeCloseTo(Math.exp(0.5), 12);
    expect(within?.logSigma).toBeCloseTo(Math.sqrt(0.5) / Math.sqrt(2 / Math.PI), 9);
    expect(Math.log(within?.upper ?? 1) + Math.log(within?.lower ?? 1)).toBeCloseTo(1, 9);
    expect(limitSet([1, 0, null].map(spread)).within).toBeNull();
  });

  it('limits the spread between wafers by chi-square, for the commonest number of wafers', () => {
    const pair = (between: number, wafers = 2): SubgroupPoint => ({
      level: 1,
      within: null,
      between,
      wafers,
    });
    const { between } = limitSet([pair(1), pair(1), pair(1, 4), single(3)]);
    // Of two values s is half-normal: its 99.73 % point is three σ.
    expect(between?.upper).toBeCloseTo(3, 9);
    expect(between?.centre).toBeCloseTo(Math.sqrt(2 / Math.PI), 9);
    expect(between?.wafers).toBe(2);
  });

  it('shifts and scales with the levels', () => {
    const list = fc.array(fc.double({ min: -100, max: 100, noNaN: true }), { minLength: 2, maxLength: 40 });
    fc.assert(
      fc.property(list, (levels) => {
        const plain = limitSet(levels.map(single));
        const moved = limitSet(levels.map((x) => single(5 - 3 * x)));
        expect(moved.level.centre).toBeCloseTo(5 - 3 * plain.level.centre, 8);
        expect(moved.level.upper).toBeCloseTo(5 - 3 * plain.level.lower, 8);
        expect(moved.movingRange.upper).toBeCloseTo(3 * plain.movingRange.upper, 8);
      }),
    );
  });
});

describe('the age of limits', () => {
  it('is provisional under 25, young to 100, established above', () => {
    expect([2, 24, 25, 100, 101].map(limitAge)).toEqual([
      'provisional',
      'provisional',
      'young',
      'young',
      'established',
    ]);
    expect(() => limitAge(-1)).toThrow(RangeError);
  });
});

describe('the interval of limits', () => {
  it('refuses a confidence that is none', () => {
    const limits = limitSet([1, 2, 3].map(single));
    for (const bad of [0, 1, NaN]) expect(() => limitInterval(limits, bad)).toThrow(RangeError);
  });

  it('has the simulated variance of the mean moving range behind it, within 3.5 standard errors', () => {
    const n = 25;
    const studies = 4000;
    const sigmas = Array.from(
      { length: studies },
      (_, k) => limitSet(normals(n, 1000 + 7919 * k).map(single)).level.sigma,
    );
    const average = sigmas.reduce((a, b) => a + b) / studies;
    const variance = sigmas.reduce((sum, s) => sum + (s - average) ** 2, 0) / (studies - 1);
    // The estimate of a variance has a relative standard error of about √(2/N).
    expect(Math.abs(variance / movingSigmaVariance(n) - 1)).toBeLessThan(3.5 * Math.sqrt(2 / studies));
    expect(Math.abs(average - 1)).toBeLessThan(3.5 * Math.sqrt(movingSigmaVariance(n) / studies));
  });

  it('holds the true upper limit about as often as it says: 90 % within four points at n = 25', () => {
    const studies = 3000;
    let held = 0;
    let heldWithin = 0;
    for (let k = 0; k < studies; k++) {
      const values = normals(50, 5 + 104729 * k);
      const points = values
        .slice(0, 25)
        .map((level, i) => ({ ...single(level), within: Math.exp(values[25 + i] ?? 0) }));
      const { level, within } = limitInterval(limitSet(points));
      if (level.upper.low <= 3 && 3 <= level.upper.high) held++;
      if (within && within.upper.low <= Math.exp(3) && Math.exp(3) <= within.upper.high) heldWithin++;
    }
    expect(Math.abs(held / studies - 0.9)).toBeLessThan(0.04);
    expect(Math.abs(heldWithin / studies - 0.9)).toBeLessThan(0.04);
  });

  it('narrows as the baseline grows', () => {
    const width = (n: number) => {
      const { upper } = limitInterval(limitSet(Array.from({ length: n }, (_, i) => single(i % 2)))).level;
      return upper.high - upper.low;
    };
    expect(width(100) / width(25)).toBeCloseTo(0.5, 1);
  });
});
