import { describe, expect, it } from 'vitest';
import { varianceComponents } from '@/lib/control/variance-components';
import { andersonDarling } from '@/lib/stats/anderson-darling';
import { betaCdf, betaQuantile } from '@/lib/stats/beta-distribution';
import { chiSquareCdf, chiSquareQuantile, chiSquareUpperTail } from '@/lib/stats/chi-square';
import { fCdf, fQuantile, fUpperTail } from '@/lib/stats/f-distribution';
import { ljungBox } from '@/lib/stats/ljung-box';
import { logGamma } from '@/lib/stats/log-gamma';
import { mannKendall } from '@/lib/stats/mann-kendall';
import { noncentralTCdf } from '@/lib/stats/noncentral-t';
import { quantile } from '@/lib/stats/quantile';
import { seededRandom } from '@/lib/stats/seeded-random';
import { standardNormalCdf, standardNormalLogCdf, standardNormalQuantile } from '@/lib/stats/standard-normal';
import { studentTCdf, studentTQuantile } from '@/lib/stats/student-t';
import { theilSen } from '@/lib/stats/theil-sen';
import { generalPurpose, generalPurposePresent, type Question } from '../support/general-purpose';

/** A question, what we say to it, and how near we claim to be. */
type Claim = [name: string, arguments_: unknown[], ours: number[], relative: number];

const freedoms = [0.7, 1, 2, 5, 30, 500, 20_000];
const parts = [1e-8, 0.001, 0.025, 0.3, 0.8, 0.975, 0.99865];

/** What a claim says of each of many arguments. */
function each(name: string, ours: (...x: number[]) => number, list: number[][], relative = 1e-10): Claim[] {
  return list.map((x) => [name, x, [ours(...x)], relative]);
}

const pairs = (a: number[], b: number[]): number[][] => a.flatMap((x) => b.map((y) => [x, y]));
const random = seededRandom('general purpose');
const normals = (n: number): number[] => Array.from({ length: n }, () => random.normal());
const samples = [
  normals(40),
  normals(200).map((x) => Math.exp(x / 3)),
  normals(60).map((x) => Math.round(2 * x) / 2),
];
const freedomPairs = pairs(freedoms, freedoms);

const claims: Claim[] = [
  ...each(
    'gammaln',
    logGamma,
    pairs([1e-3, 0.5, 3.3, 9.9, 12, 1e4], [0]).map(([x]) => [x ?? 0]),
  ),
  ...each('norm.cdf', standardNormalCdf, [[-30], [-3], [-0.5], [1.2], [4]]),
  ...each('norm.logcdf', standardNormalLogCdf, [[-60], [-3], [-0.5], [1.2]]),
  ...each(
    'norm.ppf',
    standardNormalQuantile,
    parts.map((p) => [p]),
  ),
  ...each('t.cdf', studentTCdf, pairs([-40, -3, -0.4, 1e-5, 2.2], freedoms)),
  // scipy's own quantile of t is good to 1e-9 only (2.57058183661 for 2.57058183564 at 0.975 and 5): its cdf judges ours.
  ...pairs(parts, freedoms).map(([p = 0, v = 0]): Claim => [
    't.cdf',
    [studentTQuantile(p, v), v],
    [p],
    1e-10,
  ]),
  ...each(
    'chi2.cdf',
    (x, v) => chiSquareCdf(x, v),
    freedoms.flatMap((v) => [
      [v / 2, v],
      [v * 1.1, v],
    ]),
  ),
  ...each(
    'chi2.sf',
    chiSquareUpperTail,
    freedoms.flatMap((v) => [
      [v * 0.9, v],
      [v + 6 * Math.sqrt(v), v],
    ]),
  ),
  ...each('chi2.ppf', chiSquareQuantile, pairs(parts, freedoms)),
  ...each(
    'f.cdf',
    fCdf,
    freedomPairs.map((v) => [0.8, ...v]),
  ),
  ...each(
    'f.sf',
    fUpperTail,
    freedomPairs.flatMap((v) => [
      [1.1, ...v],
      [4, ...v],
    ]),
  ),
  ...each(
    'f.ppf',
    fQuantile,
    pairs([0.025, 0.3, 0.975], [0]).flatMap(([p = 0]) => freedomPairs.map((v) => [p, ...v])),
  ),
  ...each(
    'beta.cdf',
    (x, a, b) => betaCdf(x, a, b),
    pairs([0.02, 0.4, 0.9], [0.6, 4, 80]).flatMap((v) => [
      [...v, 2],
      [...v, 90],
    ]),
  ),
  ...each(
    'beta.ppf',
    betaQuantile,
    pairs([0.05, 0.5, 0.9], [0.6, 4, 80]).flatMap((v) => [
      [...v, 2],
      [...v, 90],
    ]),
  ),
  ...each(
    'nct.cdf',
    noncentralTCdf,
    [
      [1, 5, 0.5],
      [20, 29, 21],
      [45, 99, 44],
      [-2, 10, -1.2],
      [3, 4, 0],
    ],
    1e-8,
  ),
  ...samples.flatMap((sample): Claim[] => {
    const darling = andersonDarling(sample);
    const box = ljungBox(sample);
    const places = sample.map((_, i) => i);
    const slope = theilSen(places, sample);
    return [
      ['anderson', [sample], [darling?.statistic ?? 0, darling?.p ?? 0], 1e-8],
      ['ljung-box', [sample, box?.lags], [box?.statistic ?? 0, box?.p ?? 0], 1e-10],
      ['quantile', [sample, 0.3], [quantile(sample, 0.3)], 1e-12],
      ['theilslopes', [sample, places], [slope?.slope ?? 0, slope?.low ?? 0, slope?.high ?? 0], 1e-10],
    ];
  }),
  [
    'kendall.exact',
    [
      [1, 2, 3, 4, 5, 6, 7],
      [3, 1, 2, 5, 7, 4, 6],
    ],
    [mannKendall([3, 1, 2, 5, 7, 4, 6])?.p ?? 0],
    1e-12,
  ],
];

/** Values of lots of unequal size, of wafers of unequal size, and what a dense restricted likelihood says of them. */
const unequal = [3, 1, 5, 2, 4, 3].flatMap((wafers, lot) => {
  const level = 3 * random.normal();
  return Array.from({ length: wafers }, (_, wafer) => {
    const here = level + random.normal();
    return Array.from({ length: 2 + ((lot + wafer) % 4) }, () => ({
      labels: [`L${lot}`, `W${wafer}`],
      value: 50 + here + random.normal(),
    }));
  }).flat();
});
claims.push([
  'reml',
  [unequal.map(({ value }) => value), unequal.map(({ labels }) => labels)],
  varianceComponents(unequal, ['lot', 'wafer']).levels.map(({ reml }) => reml ?? 0),
  1e-8,
]);

describe.skipIf(!generalPurposePresent)(
  'a general-purpose package (scipy, statsmodels; skipped where absent)',
  () => {
    it('agrees with every distribution and test to the digits that each claims', () => {
      const answers = generalPurpose(claims.map(([name, given]): Question => [name, given]));
      expect(answers).toHaveLength(claims.length);
      const apart = claims.flatMap(([name, given, ours, relative], i) =>
        (answers[i] ?? []).flatMap((answer, j) => {
          const off =
            answer === null ? 0 : Math.abs((ours[j] ?? NaN) - answer) / Math.max(Math.abs(answer), 1e-300);
          return off <= relative
            ? []
            : [`${name}(${JSON.stringify(given).slice(0, 60)}): ${ours[j]}, not ${answer}`];
        }),
      );
      expect(apart).toEqual([]);
    });
  },
);
