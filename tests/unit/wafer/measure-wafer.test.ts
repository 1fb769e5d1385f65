import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { measureWafer } from '@/lib/wafer/measure-wafer';
import { planGeometry } from '@/lib/wafer/plan-geometry';
import { polarSites } from '@/lib/wafer/polar-sites';
import { withValue } from '../../support/sound-wafer';

const diameterMm = 200;
const plan = (rings: number) => planGeometry(polarSites(rings, 97), { diameterMm, edgeExclusionMm: 3 });
const nine = plan(1);
const fortyNine = plan(3);

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
