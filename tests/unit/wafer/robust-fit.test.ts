import { describe, expect, it } from 'vitest';
import { seededRandom } from '@/lib/stats/seeded-random';
import { neighbourCorrelation } from '@/lib/wafer/neighbour-correlation';
import { patchGains } from '@/lib/wafer/patch-gains';
import { planGeometry } from '@/lib/wafer/plan-geometry';
import { polarSites } from '@/lib/wafer/polar-sites';
import { fitCoefficients, fitResiduals } from '@/lib/wafer/surface-fit';
import { trimmedResiduals } from '@/lib/wafer/trimmed-residuals';
import { surfaceVariance, weightedFit } from '@/lib/wafer/weighted-fit';
import { simulatedWafer, withFeature } from '../../support/simulated-wafer';

const geometry = planGeometry(polarSites(3, 97), { diameterMm: 200, edgeExclusionMm: 3 });
const { screenFit: fit, patches } = geometry.whole;
const readings = Float64Array.from(simulatedWafer(geometry, seededRandom('robust fit')));
const plain = fitResiduals(fit, readings, fitCoefficients(fit, readings));
const squaresOf = (residuals: Float64Array) => residuals.reduce((sum, e) => sum + e * e, 0);
const without = (sites: Int32Array) => Float64Array.from(readings, (_, i) => (sites.includes(i) ? 0 : 1));

describe('weightedFit', () => {
  it('with all weights 1 is the plain fit, and its variance the leverage', () => {
    const solved = weightedFit(readings, fit, new Float64Array(49).fill(1))!;
    fitCoefficients(fit, readings).forEach((value, k) =>
      expect(solved.coefficients[k]).toBeCloseTo(value, 6),
    );
    fit.leverage.forEach((value, i) => expect(surfaceVariance(fit, solved, i)).toBeCloseTo(value, 6));
  });

  it('is null where too few readings count', () => {
    expect(weightedFit(readings, fit, new Float64Array(49))).toBeNull();
  });
});

describe('patchGains', () => {
  it('are the F ratios of fits made anew without each patch', () => {
    const gains = patchGains(plain, patches, fit.terms.length);
    patches.members.forEach((sites, patch) => {
      const weights = without(sites);
      const { coefficients } = weightedFit(readings, fit, weights)!;
      const left = squaresOf(fitResiduals(fit, readings, coefficients).map((e, i) => e * weights[i]!));
      const gone = squaresOf(plain) - left;
      const f = gone / sites.length / (left / (49 - fit.terms.length - sites.length));
      expect(gains[patch]! / f).toBeCloseTo(1, 5);
    });
  });

  it('are finite for a wafer without any residual', () => {
    expect(patchGains(new Float64Array(49), patches, fit.terms.length).every((gain) => gain === 0)).toBe(
      true,
    );
  });
});

describe('trimmedResiduals', () => {
  it('do not bend to eight sites of the rim, as the plain fit does', () => {
    const rim = [25, 26, 27, 28, 29, 30, 31, 32];
    const spoiled = Float64Array.from(withFeature([...readings], rim, 10, seededRandom('rim')));
    const bent = fitResiduals(fit, spoiled, fitCoefficients(fit, spoiled));
    const gains = patchGains(bent, patches, fit.terms.length);
    const telling = [...gains.keys()].sort((a, b) => gains[b]! - gains[a]!).map((i) => patches.members[i]!);
    const straight = trimmedResiduals(spoiled, fit, bent, telling);
    const percentOff = (residuals: Float64Array) => Math.min(...rim.map((i) => residuals[i]! / 0.1));
    expect(percentOff(bent)).toBeLessThan(1);
    expect(percentOff(straight)).toBeGreaterThan(5);
  });
});

describe('neighbourCorrelation', () => {
  it('of 1, 1, −1, −1 in a row is 1/3 (its formula, by hand), and 0 where there is nothing', () => {
    const row = Int32Array.of(0, 1, 1, 2, 2, 3);
    expect(neighbourCorrelation(Float64Array.of(1, 1, -1, -1), row)).toBeCloseTo(1 / 3, 12);
    expect(neighbourCorrelation(new Float64Array(4), row)).toBe(0);
    expect(neighbourCorrelation(Float64Array.of(1), new Int32Array(0))).toBe(0);
  });
});
