import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { betaCdf, betaQuantile } from '@/lib/stats/beta-distribution';
import { fCdf, fQuantile, fUpperTail } from '@/lib/stats/f-distribution';
import { noncentralTCdf } from '@/lib/stats/noncentral-t';
import { rootBetween } from '@/lib/stats/root-between';
import { standardNormalCdf, standardNormalLogCdf } from '@/lib/stats/standard-normal';
import { studentTCdf, studentTQuantile } from '@/lib/stats/student-t';

const freedom = fc.double({ min: 0.5, max: 5000, noNaN: true });
const part = fc.double({ min: 1e-6, max: 1 - 1e-6, noNaN: true });

describe("Student's t", () => {
  it('has the quantiles of the NIST/SEMATECH e-Handbook, section 1.3.6.7.2 (from memory)', () => {
    expect(studentTQuantile(0.975, 10)).toBeCloseTo(2.228, 3);
    expect(studentTQuantile(0.95, 4)).toBeCloseTo(2.132, 3);
    expect(studentTQuantile(0.5, 3)).toBe(0);
  });

  it('is a Cauchy distribution with one degree of freedom', () => {
    for (const t of [-1e6, -2, 0.3, 50]) {
      expect(studentTCdf(t, 1) / (0.5 + Math.atan(t) / Math.PI)).toBeCloseTo(1, t < -100 ? 9 : 13);
    }
  });

  it('comes back from its own inverse', () => {
    fc.assert(
      fc.property(part, freedom, (p, df) => {
        expect(studentTCdf(studentTQuantile(p, df), df)).toBeCloseTo(p, 11);
      }),
    );
  });
});

describe('the F distribution', () => {
  it('gives the precision limit √F(0.95; 5, 125) of the e-Handbook, section 2.6.2: 0.09283 over 0.06139', () => {
    expect(Math.sqrt(fQuantile(0.95, 5, 125)) * 0.06139).toBeCloseTo(0.09283, 5);
  });

  it('is the square of t with one degree of freedom above', () => {
    expect(fQuantile(0.95, 1, 7)).toBeCloseTo(studentTQuantile(0.975, 7) ** 2, 11);
  });

  it('turns over with its degrees of freedom, and comes back from its inverse', () => {
    fc.assert(
      fc.property(part, freedom, freedom, (p, a, b) => {
        const x = fQuantile(p, a, b);
        expect(fCdf(x, a, b)).toBeCloseTo(p, 10);
        expect(fUpperTail(x, a, b)).toBeCloseTo(fCdf(1 / x, b, a), 10);
      }),
    );
  });
});

describe('the beta distribution', () => {
  it('is even with both shapes 1, a power with one of them 1, and symmetrical about one half', () => {
    expect(betaCdf(0.3, 1, 1)).toBeCloseTo(0.3, 14);
    expect(betaCdf(0.3, 4, 1)).toBeCloseTo(0.3 ** 4, 14);
    for (const shape of [0.5, 3, 200, 1e5]) expect(betaCdf(0.5, shape, shape)).toBeCloseTo(0.5, 11);
    expect(betaQuantile(0.05, 1, 3)).toBeCloseTo(1 - 0.95 ** (1 / 3), 13);
  });
});

describe('the non-central t distribution', () => {
  it('is Student’s without a shift, and nearly normal with many degrees of freedom', () => {
    for (const t of [-2, 0.5, 3]) expect(noncentralTCdf(t, 6, 0)).toBeCloseTo(studentTCdf(t, 6), 12);
    expect(noncentralTCdf(126.4, 1e7, 126)).toBeCloseTo(standardNormalCdf(0.4), 3);
  });

  it('lies below zero when the normal part does, whatever the degrees of freedom', () => {
    for (const df of [0.4, 3, 800])
      expect(noncentralTCdf(0, df, 1.3)).toBeCloseTo(standardNormalCdf(-1.3), 10);
  });
});

describe('distributions', () => {
  it('refuse what is no probability, no freedom or not finite', () => {
    const wrong = [
      () => studentTCdf(NaN, 3),
      () => studentTCdf(1, 0),
      () => studentTQuantile(1, 3),
      () => fCdf(1, 0, 3),
      () => fCdf(Infinity, 1, 3),
      () => fQuantile(0, 1, 3),
      () => betaCdf(1.1, 1, 1),
      () => betaCdf(0.5, 0, 1),
      () => betaQuantile(0, 1, 1),
      () => noncentralTCdf(NaN, 3, 0),
      () => noncentralTCdf(1, -1, 0),
      () => standardNormalLogCdf(-Infinity),
      () => rootBetween((x) => x * x + 1, -1, 1),
    ];
    for (const call of wrong) expect(call).toThrow(RangeError);
  });
});
