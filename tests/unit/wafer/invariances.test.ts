import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { measureWafer } from '@/lib/wafer/measure-wafer';
import { planGeometry } from '@/lib/wafer/plan-geometry';
import { polarSites } from '@/lib/wafer/polar-sites';
import { soundWafer, withValue } from '../../support/sound-wafer';

const diameterMm = 200;
const fortyNine = planGeometry(polarSites(3, 97), { diameterMm, edgeExclusionMm: 3 });

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
