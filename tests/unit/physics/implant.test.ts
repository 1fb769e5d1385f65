import { describe, expect, it } from 'vitest';
import { implantShare } from '@/lib/physics/implant-share';
import type { ImplantShape, Layer } from '@/lib/physics/layer';
import { layerDose, peakOfDose } from '@/lib/physics/layer-dose';
import { implantPeakShare, layerExtent } from '@/lib/physics/layer-extent';
import { layerOfTarget } from '@/lib/physics/layer-of-target';
import { sheetResistance } from '@/lib/physics/sheet-resistance';
import { IMPLANT } from './targets';

describe('an implant', () => {
  const shape: ImplantShape = { profile: 'implant', rangeUm: 0.1, lengthUm: 0.04, spreadUm2: 0 };

  it('has as implanted the peak dose/(√(2π)·straggle) at its range, and what the surface lets in', () => {
    const peak = peakOfDose(shape, 1e14);
    expect(peak / (1e14 / (Math.sqrt(2 * Math.PI) * 0.04e-4))).toBeCloseTo(1, 12);
    expect(implantShare(shape, 0.1).share).toBe(1);
    // 2.5 straggles under the surface 0.62 % of a normal distribution lie above it (tables of the normal law).
    expect(layerDose({ ...shape, peakDensityPerCm3: peak }) / 1e14).toBeCloseTo(1 - 0.00621, 5);
  });

  it('keeps its dose through a drive-in: the surface lets nothing out', () => {
    for (const spreadUm2 of [1e-6, 1e-4, 1e-3, 0.01, 0.1]) {
      const driven = { ...shape, spreadUm2 };
      let sum = 0;
      for (let i = 0; i < 20_000; i++) sum += implantShare(driven, (i + 0.5) * 1e-4).share * 1e-4;
      const dose = layerDose({ ...driven, peakDensityPerCm3: 1e19 }) / 1e15;
      expect(sum).toBeCloseTo(dose, 6);
    }
  });

  it('follows the diffusion equation: ∂N/∂τ = ½·∂²N/∂x², with a level surface', () => {
    for (const spreadUm2 of [5e-4, 0.005]) {
      const driven = { ...shape, spreadUm2 };
      const at = (x: number): number => implantShare(driven, x).share;
      for (const x of [0.02, 0.1, 0.25]) {
        const h = 1e-4;
        const curvature = (at(x + h) - 2 * at(x) + at(x - h)) / h ** 2;
        expect(implantShare(driven, x).slopePerUm2).toBeCloseTo(curvature / 2, 3);
      }
      expect((at(1e-5) - at(0)) / 1e-5).toBeCloseTo(0, 2);
    }
  });

  it('begins its drive-in where it was implanted: no step at a spread of nothing', () => {
    for (const x of [0.01, 0.1, 0.2]) {
      const [before, after] = [implantShare(shape, x), implantShare({ ...shape, spreadUm2: 1e-12 }, x)];
      expect(after.share).toBeCloseTo(before.share, 8);
      expect(after.slopePerUm2 / before.slopePerUm2).toBeCloseTo(1, 5);
    }
  });

  it('gives numbers for a drive-in too short to move anything', () => {
    const hardly = implantShare({ ...shape, spreadUm2: 1e-300 }, 0.08);
    expect(hardly).toEqual(implantShare(shape, 0.08));
    expect(Number.isFinite(implantShare({ ...shape, spreadUm2: 2e-15 }, 0).slopePerUm2)).toBe(true);
  });

  it('ends as the gaussian of its dose at the surface when driven far', () => {
    const far = { ...shape, spreadUm2: 100 };
    const half = layerDose({ ...far, peakDensityPerCm3: 1 }) / 1e-4;
    expect(implantShare(far, 0).share / (half * Math.sqrt(2 / (Math.PI * 100)))).toBeCloseTo(1, 3);
    expect(implantPeakShare(far)).toBeLessThan(0.01);
  });

  it('that is buried has two junctions and conducts between them', () => {
    const layer: Layer = {
      ...shape,
      rangeUm: 0.5,
      dopant: 'boron',
      peakDensityPerCm3: 1e18,
      backgroundDopant: 'phosphorus',
      backgroundDensityPerCm3: 1e15,
    };
    const reach = 0.04 * Math.sqrt(2 * Math.log(1000));
    const extent = layerExtent(layer);
    expect(extent.topUm).toBeCloseTo(0.5 - reach, 9);
    expect(extent.junctionUm).toBeCloseTo(0.5 + reach, 9);
    expect(sheetResistance(layer).topUm).toBe(extent.topUm);
  });

  it('that a drive-in has thinned below its background is no layer any more', () => {
    const layer = layerOfTarget({ ...IMPLANT, backgroundDensityPerCm3: 2e18 }, 3e18);
    expect(() => layerExtent({ ...layer, ...shape, spreadUm2: 1 })).toThrow(/nowhere heavier/);
  });

  it('refuses lengths that cannot be', () => {
    const layer = layerOfTarget(IMPLANT, 3e18);
    expect(() => layerExtent({ ...layer, ...shape, rangeUm: -1 })).toThrow(RangeError);
    expect(() => layerExtent({ ...layer, ...shape, lengthUm: 0 })).toThrow(RangeError);
    expect(() => layerExtent({ ...layer, ...shape, spreadUm2: Number.NaN })).toThrow(RangeError);
    expect(() => peakOfDose(shape, 0)).toThrow(RangeError);
  });
});
