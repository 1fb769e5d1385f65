import { describe, expect, it } from 'vitest';
import { individualsCharts } from '@/lib/control/individuals-charts';
import { limitSet } from '@/lib/control/limit-set';
import { meanSpreadCharts } from '@/lib/control/mean-spread-charts';
import { movingRangeSigma } from '@/lib/control/moving-range-sigma';
import { nestedCharts } from '@/lib/control/nested-charts';
import { pooledSigma } from '@/lib/control/pooled-sigma';
import { rangeLaw, sigmaWithin, standardDeviationLaw } from '@/lib/control/spread-law';
import type { SigmaSource, StudyOptions } from '@/lib/control/study-chart';
import { mean } from '@/lib/stats/mean';
import { seededRandom } from '@/lib/stats/seeded-random';

const classical: StudyOptions = { rules: [], limits: 'classical' };

describe('σ', () => {
  it('from the median moving range is the median over 0.954, and a jump leaves it where it is', () => {
    // D. J. Wheeler, Advanced Topics in Statistical Process Control: limits at 3.145 median moving ranges (from memory).
    expect(3 * movingRangeSigma([1, 2, 1, 2], 'median-moving-range')).toBeCloseTo(3.145, 3);
    const calm = [5, 6, 5, 6, 5, 6, 5, 6];
    expect(movingRangeSigma([...calm, 90, 5, 6], 'median-moving-range')).toBeCloseTo(
      movingRangeSigma(calm, 'median-moving-range'),
      12,
    );
    expect(() => movingRangeSigma([1])).toThrow(RangeError);
  });

  it.each<[SigmaSource, (groups: number[][]) => number]>([
    ['mean-moving-range', (groups) => movingRangeSigma(groups.flat())],
    ['median-moving-range', (groups) => movingRangeSigma(groups.flat(), 'median-moving-range')],
    ['mean-range', (groups) => sigmaWithin(groups, rangeLaw)],
    ['mean-s', (groups) => sigmaWithin(groups, standardDeviationLaw)],
    ['pooled-s', (groups) => pooledSigma(groups)],
  ])('from the %s comes out right in the mean, subgroups unequal', (_, sigmaOf) => {
    const source = seededRandom('sigma sources');
    const found = Array.from({ length: 1500 }, () =>
      sigmaOf([2, 3, 5, 4, 9, 2].map((n) => Array.from({ length: n }, () => 7 + 3 * source.normal()))),
    );
    const centre = mean(found);
    const error = Math.sqrt(found.reduce((sum, s) => sum + (s - centre) ** 2, 0)) / found.length;
    // The median of a few ranges is not quite unbiased: 2 % is allowed for it, common practice, no source.
    const allowed = _ === 'median-moving-range' ? 0.06 : 0;
    expect(Math.abs(centre - 3)).toBeLessThan(3.5 * error + allowed);
  });

  it('is named on each chart, and refused where the chart does not know the estimator', () => {
    const groups = [
      [1, 3],
      [2, 7, 4],
      [4, 4],
    ];
    const by = (estimator?: SigmaSource) =>
      meanSpreadCharts(groups, standardDeviationLaw, { ...classical, ...(estimator ? { estimator } : {}) });
    expect(by().map((chart) => chart.estimator)).toEqual(['mean-s', 'mean-s']);
    const [level, spread] = by('pooled-s');
    expect([level?.estimator, spread?.estimator]).toEqual(['pooled-s', 'pooled-s']);
    expect((level?.sigma as number[])[0]).toBeCloseTo(pooledSigma(groups) / Math.SQRT2, 12);
    expect(() => by('mean-range')).toThrow(RangeError);
    expect(() => individualsCharts([1, 2], { ...classical, estimator: 'mean-s' })).toThrow(RangeError);
    const [single] = individualsCharts([1, 2, 1, 9], { ...classical, estimator: 'median-moving-range' });
    expect(single).toMatchObject({ estimator: 'median-moving-range' });
    const points = [1, 2, 1, 9].map((value) => ({ level: value, within: null, between: null, wafers: 1 }));
    expect(limitSet(points, { estimator: 'median-moving-range' }).level.sigma).toBe(single?.sigma);
  });
});

describe('a study of runs of several wafers', () => {
  const runs = [
    [
      [1, 3],
      [2, 4],
    ],
    [
      [5, 7],
      [6, 8],
      [10, 12],
    ],
    [
      [2, 2],
      [3, 3],
    ],
  ];

  it('judges runs, not wafers, by the distances between runs', () => {
    const [level, ranges, between, within] = nestedCharts(runs, classical);
    const [individuals] = individualsCharts([2.5, 8, 2.5], classical);
    expect(level).toEqual(individuals);
    expect(ranges?.points).toEqual([null, 5.5, 5.5]);
    expect(between).toMatchObject({ name: 'between', estimator: 'pooled-s' });
    expect(between?.points[0]).toBeCloseTo(Math.SQRT1_2, 12);
    // Pooled over 1, 2 and 1 degrees of freedom: wafer means 2 3, 6 7 11, 2 3.
    const pooled = pooledSigma([
      [2, 3],
      [6, 7, 11],
      [2, 3],
    ]);
    expect(pooled).toBeCloseTo(Math.sqrt((0.5 + 14 + 0.5) / 4) / 0.9399856, 6);
    expect((between?.centre as number[])[0]).toBeCloseTo(pooled * 0.7978846, 6);
    expect(within?.points).toHaveLength(7);
  });

  it('lets a wafer with more sites weigh no more in its run', () => {
    const [level] = nestedCharts(
      [
        [
          [0, 0, 0, 0],
          [3, 3],
        ],
        [
          [1, 1],
          [2, 2],
        ],
      ],
      classical,
    );
    expect(level?.points).toEqual([1.5, 1.5]);
  });

  it('is refused without runs, wafers or sites to spread', () => {
    expect(() =>
      nestedCharts(
        [
          [
            [1, 2],
            [3, 4],
          ],
        ],
        classical,
      ),
    ).toThrow(RangeError);
    expect(() => nestedCharts([[[1, 2]], [[3, 4]]], classical)).toThrow(RangeError);
    expect(() =>
      nestedCharts(
        [
          [[1], [2]],
          [[3], [4]],
        ],
        classical,
      ),
    ).toThrow(RangeError);
    expect(() =>
      nestedCharts(
        [
          [],
          [
            [1, 2],
            [2, 3],
          ],
        ],
        classical,
      ),
    ).toThrow(RangeError);
  });
});
