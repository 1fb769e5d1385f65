import { describe, expect, it } from 'vitest';
import { individualsCharts } from '@/lib/control/individuals-charts';
import { meanSpreadCharts } from '@/lib/control/mean-spread-charts';
import { WESTERN_ELECTRIC } from '@/lib/control/rule';
import { rangeLaw, sigmaWithin, spreadLimits, standardDeviationLaw } from '@/lib/control/spread-law';
import type { StudyOptions } from '@/lib/control/study-chart';
import { threeWayCharts } from '@/lib/control/three-way-charts';
import { c4 } from '@/lib/stats/c4';
import { rangeConstants } from '@/lib/stats/range-distribution';

const classical: StudyOptions = { rules: WESTERN_ELECTRIC, limits: 'classical' };

describe('a study of individuals', () => {
  it('judges points after the baseline by the limits of the baseline, counted from 1', () => {
    const [level, ranges] = individualsCharts([1, 2, 1, 2, 9], { ...classical, baseline: 4 });
    expect(level?.centre).toBe(1.5);
    expect(level?.signals).toEqual([{ point: 5, rule: 'beyond-3-sigma', side: 'above', participants: [5] }]);
    expect(ranges?.points).toEqual([null, 1, 1, 1, 7]);
    expect(ranges?.signals).toEqual([{ point: 5, rule: 'beyond-limit', side: 'above', participants: [5] }]);
  });

  it('is refused with fewer than two values or a baseline that does not fit', () => {
    expect(() => individualsCharts([], classical)).toThrow(RangeError);
    expect(() => individualsCharts([1], classical)).toThrow(RangeError);
    for (const baseline of [1, 4, 2.5]) {
      expect(() => individualsCharts([1, 2, 3], { ...classical, baseline })).toThrow(RangeError);
    }
  });

  it('has no signal and no width when all are equal', () => {
    const charts = individualsCharts([0.1, 0.1, 0.1, 0.1], classical);
    expect(charts.flatMap((chart) => chart.signals)).toEqual([]);
    expect(charts[0]).toMatchObject({ lower: 0.1, upper: 0.1, sigma: 0 });
  });
});

describe('a study of subgroups', () => {
  const unequal = [[1, 2, 3], [2, 4], [1, 3, 5, 2], [3]];

  it('estimates σ from equal subgroups as mean range over d2 and mean s over c4', () => {
    const equal = [
      [1, 3],
      [2, 7],
      [4, 4],
    ];
    expect(sigmaWithin(equal, rangeLaw)).toBeCloseTo(7 / 3 / rangeConstants(2).d2, 12);
    expect(sigmaWithin(equal, standardDeviationLaw)).toBeCloseTo(7 / 3 / Math.SQRT2 / c4(2), 12);
  });

  it('gives lists where subgroups are unequal, and no limits to the spread of one value', () => {
    const [level, spread] = meanSpreadCharts(unequal, rangeLaw, classical);
    expect(level?.points).toEqual([2, 3, 2.75, 3]);
    expect(level?.centre).toBeCloseTo(26 / 10, 12);
    const sigma = sigmaWithin(unequal, rangeLaw);
    [3, 2, 4, 1].forEach((n, i) => {
      expect((level?.upper as number[])[i]).toBeCloseTo(2.6 + (3 * sigma) / Math.sqrt(n), 12);
    });
    expect(spread?.points).toEqual([2, 2, 4, null]);
    expect((spread?.upper as (number | null)[])[3]).toBeNull();
  });

  it('has no spread to study when every subgroup is one value', () => {
    expect(() => meanSpreadCharts([[1], [2]], rangeLaw, classical)).toThrow(RangeError);
    expect(() => meanSpreadCharts([[1, 2], []], rangeLaw, classical)).toThrow(RangeError);
  });

  it('limits the range by probability where the published factors lie: 0.15 and 5.38 … for five values', () => {
    // Factors D.001 = 0.37 and D.999 = 5.48 of E. S. Pearson, Biometrika 32, 301 (1942), bracket 0.135 % (from memory).
    const { lower, upper } = spreadLimits(rangeLaw, 5, 1, 'probability');
    expect(lower).toBeGreaterThan(0.37);
    expect(lower).toBeLessThan(0.45);
    expect(upper).toBeLessThan(5.48);
    expect(upper).toBeGreaterThan(5.3);
  });

  it('of a three-way chart takes its level limits from the means alone', () => {
    const wide = [
      [0, 10],
      [1, 11],
      [0, 10],
      [1, 11],
    ];
    const [level, ranges, within] = threeWayCharts(wide, classical);
    const [individuals] = individualsCharts([5, 6, 5, 6], classical);
    expect(level).toEqual(individuals);
    expect(ranges?.name).toBe('moving-range');
    expect(within).toMatchObject({ name: 'within', lower: 0, signals: [] });
    expect(within?.centre).toBeCloseTo(Math.sqrt(50), 12);
  });

  it('takes lognormal limits of the spread on request, and chi-square ones where no spread is positive', () => {
    const probability: StudyOptions = { ...classical, limits: 'probability' };
    const [, , within] = threeWayCharts(
      [
        [0, 1],
        [0, 2],
        [0, 1],
        [0, 2],
        [0, 90],
      ],
      { ...probability, baseline: 4 },
    );
    expect(within?.centre).toBeCloseTo(1, 12);
    expect(within?.signals).toEqual([{ point: 5, rule: 'beyond-limit', side: 'above', participants: [5] }]);
    const [, , flat] = threeWayCharts(
      [
        [1, 1],
        [2, 2],
        [1, 1],
      ],
      probability,
    );
    expect(flat).toMatchObject({ centre: 0, upper: 0, signals: [] });
  });
});
