import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { measureWafer } from '@/lib/wafer/measure-wafer';
import { planGeometry } from '@/lib/wafer/plan-geometry';
import { polarSites } from '@/lib/wafer/polar-sites';
import type { Site } from '@/lib/wafer/site';

const diameterMm = 200;
const plan = (rings: number) => planGeometry(polarSites(rings, 97), { diameterMm, edgeExclusionMm: 3 });
const nine = plan(1);
const fortyNine = plan(3);

/** A sound wafer: bowl, tilt, and a fixed scatter of about 0.2 %. */
function soundWafer(sites: readonly Site[], level = 10): number[] {
  return sites.map(
    ({ xMm, yMm }, i) =>
      level *
      (1 +
        0.02 * ((xMm * xMm + yMm * yMm) / 97 ** 2) +
        0.005 * (xMm / 97) +
        0.002 * Math.sin(1 + 12.9898 * i * (1 + 0.37 * i))),
  );
}

function withValue(values: readonly number[], changes: Record<number, number | null>): (number | null)[] {
  return values.map((value, i) => (i in changes ? changes[i]! : value));
}

describe('figures', () => {
  it('of 9.8, 10.0, 10.2, 10.1, 9.9 are 1.58114, 4, 2 and 2 percent (recomputed from the definitions)', () => {
    const sites = [0, 1, 2, 3, 4].map((xMm) => ({ xMm, yMm: 0 }));
    const geometry = planGeometry(sites, { diameterMm: null, edgeExclusionMm: 0 });
    const { figures } = measureWafer([9.8, 10.0, 10.2, 10.1, 9.9], geometry, { screen: 'outliers' });
    expect(figures.mean).toBeCloseTo(10, 12);
    expect(figures.median).toBe(10);
    expect(figures.areaMean).toBeNull();
    expect(figures.relativeStandardDeviationPercent).toBeCloseTo(1.58114, 5);
    expect(figures.fullRangeOverMidrangePercent).toBeCloseTo(4, 12);
    expect(figures.halfRangeOverMidrangePercent).toBeCloseTo(2, 12);
    expect(figures.halfRangeOverMeanPercent).toBeCloseTo(2, 12);
    expect(figures.minimum).toEqual({ value: 9.8, siteIndex: 0 });
    expect(figures.maximum).toEqual({ value: 10.2, siteIndex: 2 });
  });

  it('a 4 % bowl reads 1.56 % above its true area mean with 9 sites, 0.61 % with 49 (integral of the bowl)', () => {
    for (const [geometry, over] of [
      [nine, 1.5556],
      [fortyNine, 0.6122],
    ] as const) {
      const bowl = geometry.sites.map(
        ({ xMm, yMm }) => 10 * (1 + (0.04 * (xMm * xMm + yMm * yMm)) / 97 ** 2),
      );
      const { mean, areaMean } = measureWafer(bowl, geometry, { screen: 'impossible' }).figures;
      expect(100 * (mean! / 10 - 1 - 0.02)).toBeCloseTo(over, 3);
      expect(areaMean).toBeLessThan(mean!);
      expect(areaMean).toBeGreaterThan(10 * 1.02);
    }
  });

  it('the radial variation of a 4 % bowl is 4 %, and null without a centre or with a bad one', () => {
    const bowl = fortyNine.sites.map(({ xMm, yMm }) => 10 * (1 + (0.04 * (xMm * xMm + yMm * yMm)) / 97 ** 2));
    const variation = (values: (number | null)[]) =>
      measureWafer(values, fortyNine, { screen: 'impossible' }).figures.radialVariationPercent;
    expect(variation(bowl)).toBeCloseTo(4, 10);
    expect(variation(withValue(bowl, { 0: null }))).toBeNull();
    const ringOnly = planGeometry(fortyNine.sites.slice(1), { diameterMm, edgeExclusionMm: 3 });
    const { radialVariationPercent } = measureWafer(bowl.slice(1), ringOnly, { screen: 'off' }).figures;
    expect(radialVariationPercent).toBeNull();
  });

  it('keep their digits under a huge offset', () => {
    const values = nine.sites.map((_, i) => 1e9 + (i % 2));
    const { standardDeviation } = measureWafer(values, nine, { screen: 'off' }).figures;
    expect(standardDeviation).toBeCloseTo(Math.sqrt((4 * 5) / 9 / 8), 9);
  });

  it('of no, one and two readings are null where they are not defined', () => {
    const none = measureWafer(new Array<null>(9).fill(null), nine, { screen: 'outliers' });
    expect(Object.values(none.figures).every((figure) => figure === null)).toBe(true);
    expect(none.shape).toEqual({ terms: [], residualPercent: null });
    expect(none.judgeable).toBe(false);
    const one = measureWafer([5, ...new Array<null>(8).fill(null)], nine, { screen: 'outliers' }).figures;
    expect([one.mean, one.areaMean, one.median]).toEqual([5, 5, 5]);
    expect(one.standardDeviation).toBeNull();
    expect(one.fullRangeOverMidrangePercent).toBe(0);
    const two = measureWafer([5, 7, ...new Array<null>(7).fill(null)], nine, { screen: 'outliers' }).figures;
    expect(two.median).toBe(6);
    expect(two.standardDeviation).toBeCloseTo(Math.SQRT2, 12);
    const empty = planGeometry([], { diameterMm, edgeExclusionMm: 3 });
    expect(measureWafer([], empty, { screen: 'outliers' }).judgeable).toBe(false);
  });

  it('of equal readings show no spread, and nothing is taken out', () => {
    const measure = measureWafer(new Array<number>(49).fill(7.3), fortyNine, { screen: 'outliers' });
    expect(measure.badSites).toBe(0);
    expect(measure.figures.standardDeviation).toBe(0);
    expect(measure.figures.areaMean).toBeCloseTo(7.3, 12);
    expect(measure.shape.residualPercent).toBeCloseTo(0, 9);
  });

  it('are never NaN or infinite, whatever the readings', () => {
    const wild = fc.oneof(
      fc.constant(null),
      fc.double({ noNaN: false }),
      fc.constantFrom(0, -0, NaN, Infinity, 5e-324, 1.7e308),
      fc.double({ min: 1, max: 100, noNaN: true }),
    );
    const numbers = (thing: unknown): number[] =>
      typeof thing === 'number'
        ? [thing]
        : thing !== null && typeof thing === 'object'
          ? Object.values(thing).flatMap(numbers)
          : [];
    fc.assert(
      fc.property(
        fc.array(wild, { minLength: 49, maxLength: 49 }),
        fc.constantFrom('off', 'impossible', 'outliers'),
        (values, screen) => {
          const measure = measureWafer(values, fortyNine, { screen });
          expect(numbers(measure).every(Number.isFinite)).toBe(true);
          expect(JSON.stringify(measure.features)).not.toMatch(/NaN|Infinity/);
        },
      ),
      { numRuns: 200, seed: 12 },
    );
  });
});

describe('screening', () => {
  const sound = soundWafer(fortyNine.sites);

  it('takes out impossible readings, each with its reason', () => {
    const values = withValue(sound, { 3: null, 4: 0, 5: -10, 6: NaN, 7: Infinity });
    const { status, badSites, goodSites } = measureWafer(values, fortyNine, { screen: 'impossible' });
    expect(status.slice(2, 9)).toEqual([
      'good',
      'missing',
      'zero',
      'negative',
      'not-a-number',
      'not-a-number',
      'good',
    ]);
    expect([badSites, goodSites]).toEqual([5, 44]);
    const off = measureWafer(values, fortyNine, { screen: 'off' });
    expect(off.status.slice(3, 8)).toEqual(['missing', 'good', 'good', 'not-a-number', 'not-a-number']);
  });

  it('takes out one reading that stands alone, wherever it is', () => {
    for (const site of sound.keys()) {
      for (const factor of [1.06, 0.94]) {
        const values = withValue(sound, { [site]: sound[site]! * factor });
        const measure = measureWafer(values, fortyNine, { screen: 'outliers' });
        expect([site, measure.status[site], measure.badSites]).toEqual([site, 'outlier', 1]);
        expect(measure.judgeable).toBe(true);
      }
    }
  });

  it('keeps neighbours that deviate together and names them', () => {
    const ring = [25, 26, 48];
    const values = withValue(sound, Object.fromEntries(ring.map((site) => [site, sound[site]! * 1.08])));
    const measure = measureWafer(values, fortyNine, { screen: 'outliers' });
    expect(measure.badSites).toBe(0);
    expect(measure.features.map(({ sites }) => sites)).toEqual([ring]);
    expect(measure.features[0]!.description).toMatch(
      /^3 neighbouring sites at \+x read .* above .*; edge geometry not excluded$/,
    );
  });

  it('says nothing of the edge for a feature away from it', () => {
    const inner = [0, 1, 2];
    const values = withValue(sound, Object.fromEntries(inner.map((site) => [site, sound[site]! * 0.93])));
    const [feature, ...more] = measureWafer(values, fortyNine, { screen: 'outliers' }).features;
    expect(more).toEqual([]);
    expect(feature!.description).toMatch(/near the centre read .* below/);
    expect(feature!.description).not.toMatch(/edge/);
  });

  it('leaves a plan of fewer than 25 sites to the eye', () => {
    const values = withValue(soundWafer(nine.sites), { 4: 30 });
    expect(measureWafer(values, nine, { screen: 'outliers' }).badSites).toBe(0);
  });

  it('takes out 5 % at most; with more standing alone the wafer is not judged', () => {
    const spikes = { 30: 14, 36: 15, 44: 13, 1: 16 };
    const measure = measureWafer(withValue(sound, spikes), fortyNine, { screen: 'outliers' });
    expect(measure.badSites).toBe(2);
    expect([measure.status[36], measure.status[1]]).toEqual(['outlier', 'outlier']);
    expect(measure.judgeable).toBe(false);
    expect(measure.notJudgeableReason).toMatch(/4 readings stand alone/);
  });

  it('judges a wafer with 80 % good sites, none with fewer', () => {
    const missing = (count: number) => sound.map((value, i) => (i < count ? null : value));
    expect(measureWafer(missing(9), fortyNine, { screen: 'outliers' }).judgeable).toBe(true);
    const less = measureWafer(missing(10), fortyNine, { screen: 'outliers' });
    expect(less.judgeable).toBe(false);
    expect(less.notJudgeableReason).toMatch(/39 of 49/);
  });

  it('follows a person who puts a reading back or takes one out, but not into the impossible', () => {
    const values = withValue(sound, { 9: sound[9]! * 1.08, 11: -3 });
    const overrides = new Map([
      [9, 'in'],
      [10, 'out'],
      [11, 'in'],
    ] as const);
    const { status } = measureWafer(values, fortyNine, { screen: 'outliers', overrides });
    expect([status[9], status[10], status[11]]).toEqual(['good', 'by-hand', 'negative']);
  });

  it('counts sites in the edge exclusion apart from bad ones, and does not let them in', () => {
    const geometry = planGeometry(polarSites(3, 99), { diameterMm, edgeExclusionMm: 5 });
    const values = soundWafer(geometry.sites).map((value, i) => (i > 24 ? -1 : value));
    const measure = measureWafer(values, geometry, { screen: 'outliers' });
    expect([measure.sites, measure.excludedSites, measure.badSites, measure.goodSites]).toEqual([
      49, 24, 0, 25,
    ]);
    expect(measure.judgeable).toBe(true);
  });

  it('throws on another number of values than sites', () => {
    expect(() => measureWafer([1, 2], nine, { screen: 'off' })).toThrow(RangeError);
  });
});

describe('shape', () => {
  const percentOf = (values: number[], geometry = fortyNine) =>
    Object.fromEntries(
      measureWafer(values, geometry, { screen: 'outliers' }).shape.terms.map(({ name, percent }) => [
        name,
        percent,
      ]),
    );

  it('gives back the shapes a wafer was made of', () => {
    const u = fortyNine.sites.map(({ xMm, yMm }) => [xMm / 97, yMm / 97] as const);
    const terms = percentOf(
      u.map(
        ([x, y]) =>
          50 * (1 + 0.01 * (2 * (x * x + y * y) - 1) + 0.02 * x - 0.005 * y + 0.003 * (x * x - y * y)),
      ),
    );
    const scale = (terms['level'] ?? 0) / 100;
    expect(terms['bowl']! / scale).toBeCloseTo(1, 9);
    expect(terms['tilt along x']! / scale).toBeCloseTo(2, 9);
    expect(terms['tilt along y']! / scale).toBeCloseTo(-0.5, 9);
    expect(terms['saddle on the axes']! / scale).toBeCloseTo(0.3, 9);
    expect(terms['ring']).toBeCloseTo(0, 9);
  });

  it('takes up a third of the sites at most', () => {
    const count = (rings: number) =>
      measureWafer(soundWafer(plan(rings).sites), plan(rings), { screen: 'off' }).shape.terms.length;
    expect([count(1), count(2), count(3)]).toEqual([3, 7, 15]);
  });

  it('has standard errors that hold: repeated noise scatters the terms as much as they say', () => {
    let seed = 20;
    const uniform = () => (seed = (seed * 16807) % 2147483647) / 2147483647;
    const gauss = () => Math.sqrt(-2 * Math.log(uniform())) * Math.cos(2 * Math.PI * uniform());
    const runs = Array.from({ length: 400 }, () => {
      const { shape } = measureWafer(
        fortyNine.sites.map(() => 100 + gauss()),
        fortyNine,
        { screen: 'off' },
      );
      return shape.terms.find(({ name }) => name === 'bowl')!;
    });
    const scatter = Math.sqrt(runs.reduce((sum, { percent }) => sum + percent ** 2, 0) / runs.length);
    const said = Math.sqrt(
      runs.reduce((sum, { standardError }) => sum + standardError! ** 2, 0) / runs.length,
    );
    expect(Math.abs(scatter / said - 1)).toBeLessThan(3.5 / Math.sqrt(2 * runs.length));
  });
});

describe('invariances', () => {
  const sound = soundWafer(fortyNine.sites);
  const spiked = withValue(sound, { 31: sound[31]! * 1.07 });
  const base = measureWafer(spiked, fortyNine, { screen: 'outliers' });

  it('another unit scales the figures and leaves the percentages', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-6, max: 1e6, noNaN: true }), (factor) => {
        const scaled = measureWafer(
          spiked.map((value) => value! * factor),
          fortyNine,
          { screen: 'outliers' },
        );
        expect(scaled.status).toEqual(base.status);
        expect(scaled.figures.areaMean! / factor / base.figures.areaMean!).toBeCloseTo(1, 10);
        expect(scaled.figures.relativeStandardDeviationPercent).toBeCloseTo(
          base.figures.relativeStandardDeviationPercent!,
          8,
        );
      }),
      { numRuns: 30, seed: 13 },
    );
  });

  it('turning the wafer changes neither screening nor figures nor the roundness of its shape', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 2 * Math.PI, noNaN: true }), (angle) => {
        const [c, s] = [Math.cos(angle), Math.sin(angle)];
        const sites = fortyNine.sites.map(({ xMm, yMm }) => ({
          xMm: c * xMm - s * yMm,
          yMm: s * xMm + c * yMm,
        }));
        const turned = measureWafer(spiked, planGeometry(sites, { diameterMm, edgeExclusionMm: 3 }), {
          screen: 'outliers',
        });
        expect(turned.status).toEqual(base.status);
        expect(turned.figures.areaMean).toBeCloseTo(base.figures.areaMean!, 8);
        expect(turned.figures.radialVariationPercent).toBeCloseTo(base.figures.radialVariationPercent!, 8);
        const tilt = ({ shape }: typeof base) => Math.hypot(shape.terms[1]!.percent, shape.terms[2]!.percent);
        expect(tilt(turned)).toBeCloseTo(tilt(base), 8);
        expect(turned.shape.residualPercent).toBeCloseTo(base.shape.residualPercent!, 8);
      }),
      { numRuns: 15, seed: 14 },
    );
  });

  it('the order of the sites does not matter', () => {
    fc.assert(
      fc.property(fc.shuffledSubarray([...spiked.keys()], { minLength: 49 }), (order) => {
        const geometry = planGeometry(
          order.map((i) => fortyNine.sites[i]!),
          { diameterMm, edgeExclusionMm: 3 },
        );
        const measure = measureWafer(
          order.map((i) => spiked[i]!),
          geometry,
          { screen: 'outliers' },
        );
        expect(order.map((_, at) => measure.status[order.indexOf(at)])).toEqual(base.status);
        expect(measure.figures.areaMean).toBeCloseTo(base.figures.areaMean!, 9);
        expect(measure.figures.standardDeviation).toBeCloseTo(base.figures.standardDeviation!, 9);
      }),
      { numRuns: 15, seed: 15 },
    );
  });
});

describe('planGeometry', () => {
  it('refuses sites off the wafer, sites there twice, and an exclusion without a diameter', () => {
    const at = (xMm: number, yMm = 0) => ({ xMm, yMm });
    expect(() => planGeometry([at(101)], { diameterMm, edgeExclusionMm: 0 })).toThrow('lies off');
    expect(() => planGeometry([at(1), at(1)], { diameterMm, edgeExclusionMm: 0 })).toThrow('twice');
    expect(() => planGeometry([at(NaN)], { diameterMm, edgeExclusionMm: 0 })).toThrow(RangeError);
    expect(() => planGeometry([at(1)], { diameterMm: null, edgeExclusionMm: 3 })).toThrow('diameter');
    expect(() => planGeometry([at(1)], { diameterMm, edgeExclusionMm: 100 })).toThrow('nothing');
    expect(() => planGeometry([at(1)], { diameterMm: -1, edgeExclusionMm: 0 })).toThrow(RangeError);
  });

  it('keeps a site on the border of the quality area', () => {
    expect(planGeometry(polarSites(3, 97), { diameterMm, edgeExclusionMm: 3 }).excludedSites).toBe(0);
  });
});
