import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { cusumCharts } from '@/lib/control/cusum-charts';
import { cusumFor } from '@/lib/control/cusum-for';
import { cusumRunLength } from '@/lib/control/cusum-run-length';
import { ewmaCharts } from '@/lib/control/ewma-charts';
import { ewmaFor, ewmaWidthFor } from '@/lib/control/ewma-for';
import { ewmaRunLength } from '@/lib/control/ewma-run-length';

const values = fc.array(
  fc.integer({ min: -50, max: 50 }).map((i) => i / 10),
  { minLength: 2, maxLength: 60 },
);

describe('a CUSUM chart', () => {
  it('gives the example of the NIST/SEMATECH e-Handbook, section 6.3.2.3 (from memory)', () => {
    const x = [
      324.925, 324.675, 324.725, 324.35, 325.35, 325.225, 324.125, 324.525, 325.225, 324.6, 324.625, 325.15,
      328.325, 327.25, 327.825, 328.5, 326.675, 327.775, 326.875, 328.35,
    ];
    const [above, below] = cusumCharts(x, { reference: 0.3175, decision: 4.1959 }, { target: 325, sigma: 1 });
    [3.01, 4.94, 7.45, 10.63, 11.99, 14.44, 16, 19.04].forEach((published, i) => {
      expect(Math.abs((above?.points[12 + i] ?? 0) - published)).toBeLessThan(0.0051);
    });
    expect(below?.points[3]).toBeCloseTo(0.33, 2);
    expect(above?.signals.map(({ point }) => point)).toEqual([14, 15, 16, 17, 18, 19, 20]);
    expect(below?.signals).toEqual([]);
    expect(above).toMatchObject({ name: 'cusum-above', upper: 4.1959, lower: 0, estimator: 'given' });
  });

  it('is the same in other units, and its arms change places when the values are mirrored', () => {
    fc.assert(
      fc.property(values, (list) => {
        const given = { target: 0.3, sigma: 1.1 };
        const [above, below] = cusumCharts(list, { reference: 0.5, decision: 3 }, given);
        const scaled = cusumCharts(
          list.map((x) => 7 * x + 2),
          { reference: 0.5, decision: 3 },
          { target: 7 * 0.3 + 2, sigma: 7.7 },
        );
        above?.points.forEach((c, i) => expect(scaled[0]?.points[i]).toBeCloseTo(7 * (c ?? 0), 8));
        const mirrored = cusumCharts(
          list.map((x) => 0.6 - x),
          { reference: 0.5, decision: 3 },
          given,
        );
        below?.points.forEach((c, i) => expect(mirrored[0]?.points[i]).toBeCloseTo(c ?? 0, 8));
      }),
      { numRuns: 50 },
    );
  });

  it('takes target and σ from the baseline where they are not given, and says so', () => {
    const [above] = cusumCharts([1, 2, 1, 2, 9], { reference: 0.5, decision: 5 }, { baseline: 4 });
    expect(above?.sigma).toBeCloseTo(Math.sqrt(Math.PI) / 2, 12);
    expect(above?.estimator).toBe('mean-moving-range');
    expect(above?.signals).toEqual([{ point: 5, rule: 'beyond-limit', side: 'above', participants: [5] }]);
  });
});

describe('an EWMA chart', () => {
  it('has limits that grow from λ·L·σ to the steady ones, and never the other way', () => {
    const given = { target: 10, sigma: 2, limits: 'growing' as const };
    const [grown] = ewmaCharts(
      Array.from({ length: 200 }, () => 10),
      { lambda: 0.1, width: 2.7 },
      given,
    );
    const upper = grown?.upper as number[];
    expect(upper[0]).toBeCloseTo(10 + 0.1 * 2.7 * 2, 12);
    // Second value: σ²·λ²·(1 + (1 − λ)²), from the definition.
    expect(upper[1]).toBeCloseTo(10 + 2.7 * 2 * 0.1 * Math.sqrt(1 + 0.81), 12);
    expect(upper).toEqual([...upper].sort((a, b) => a - b));
    const [steady] = ewmaCharts([10, 10], { lambda: 0.1, width: 2.7 }, { ...given, limits: 'steady' });
    expect(upper[199]).toBeCloseTo(steady?.upper as number, 12);
  });

  it('is the values themselves at λ = 1, with plain three-sigma limits from the first on', () => {
    const given = { target: 0, sigma: 1, limits: 'growing' as const };
    const [chart] = ewmaCharts([1, -4, 2], { lambda: 1, width: 3 }, given);
    expect(chart).toMatchObject({ points: [1, -4, 2], upper: 3, lower: -3 });
    expect(chart?.signals).toEqual([{ point: 2, rule: 'beyond-limit', side: 'below', participants: [2] }]);
  });

  it('weighs each value by λ·(1 − λ)^age', () => {
    fc.assert(
      fc.property(values, (list) => {
        const given = { target: 1, sigma: 1, limits: 'steady' as const };
        const [chart] = ewmaCharts(list, { lambda: 0.3, width: 3 }, given);
        const n = list.length;
        const weighted = list.reduce((sum, x, i) => sum + 0.3 * 0.7 ** (n - 1 - i) * x, 0.7 ** n);
        expect(chart?.points[n - 1]).toBeCloseTo(weighted, 9);
      }),
      { numRuns: 50 },
    );
  });

  it('is refused, as a CUSUM is, for a σ of nothing, a single value, or nonsense', () => {
    const good = { lambda: 0.2, width: 3 };
    const steady = { limits: 'steady' as const };
    for (const list of [[1], [], [1, NaN], [2, 2, 2]]) {
      expect(() => ewmaCharts(list, good, steady)).toThrow(RangeError);
      expect(() => cusumCharts(list, { reference: 0.5, decision: 5 }, {})).toThrow(RangeError);
    }
    expect(() => ewmaCharts([1, 2], { lambda: 0, width: 3 }, steady)).toThrow(RangeError);
    expect(() => ewmaCharts([1, 2], { lambda: 0.2, width: 0 }, steady)).toThrow(RangeError);
    expect(() => ewmaCharts([1, 2], good, { ...steady, sigma: -1 })).toThrow(RangeError);
    expect(() => ewmaCharts([1, 2], good, { ...steady, estimator: 'mean-s' })).toThrow(RangeError);
    expect(() => cusumCharts([1, 2], { reference: -1, decision: 5 }, {})).toThrow(RangeError);
  });
});

describe('a chart chosen for a shift', () => {
  it('is the EWMA of Lucas and Saccucci and the CUSUM of k = ½ where their tables have it', () => {
    // J. M. Lucas and M. S. Saccucci, Technometrics 32, 1 (1990): width 2.814 at λ = 0.1 for 500 points (from memory).
    expect(ewmaWidthFor(0.1, 500)).toBeCloseTo(2.814, 2);
    // J. M. Lucas, J. Quality Technology 8, 1 (1976): k = ½, h = 5 for 465 points (from memory).
    expect(cusumFor({ inControl: 465, shift: -1 })).toMatchObject({ reference: 0.5 });
    expect(cusumFor({ inControl: 465, shift: -1 }).decision).toBeCloseTo(5, 2);
  });

  it('has the wanted points between false signals, and sees its shift sooner than EWMAs of other weight', () => {
    const best = ewmaFor({ inControl: 370, shift: 1 });
    expect(ewmaRunLength(best) / 370).toBeCloseTo(1, 3);
    const at = ewmaRunLength(best, { shift: 1 });
    for (const lambda of [best.lambda / 3, best.lambda * 3]) {
      const other = { lambda, width: ewmaWidthFor(lambda, 370) };
      expect(ewmaRunLength(other, { shift: 1 })).toBeGreaterThan(at * 1.02);
    }
    expect(cusumRunLength(cusumFor({ inControl: 370, shift: 0.6 })) / 370).toBeCloseTo(1, 3);
  });

  it('has a width for each weight and each sensible number of points', () => {
    for (const inControl of [10, 100_000]) {
      for (const lambda of [0.02, 1]) {
        const width = ewmaWidthFor(lambda, inControl);
        expect(ewmaRunLength({ lambda, width }) / inControl).toBeCloseTo(1, 2);
      }
    }
  });

  it('is refused for a wish that makes no sense', () => {
    for (const wanted of [
      { inControl: 5, shift: 1 },
      { inControl: 370, shift: 0 },
      { inControl: NaN, shift: 1 },
      { inControl: 1e9, shift: 1 },
    ]) {
      expect(() => ewmaFor(wanted)).toThrow(RangeError);
      expect(() => cusumFor(wanted)).toThrow(RangeError);
    }
  });
});
