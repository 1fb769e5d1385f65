import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { implantShare } from '@/lib/physics/implant-share';
import type { ImplantShape, Layer } from '@/lib/physics/layer';
import { layerDensity } from '@/lib/physics/layer-density';
import { layerDose, peakOfDose } from '@/lib/physics/layer-dose';
import { implantPeakShare, layerExtent } from '@/lib/physics/layer-extent';
import { layerOfTarget } from '@/lib/physics/layer-of-target';
import { pairsShape } from '@/lib/physics/pairs-shape';
import { sheetResistance } from '@/lib/physics/sheet-resistance';
import { standardResistivity } from '@/lib/physics/standard-resistivity';
import { DRIVEN, ERFC, GAUSSIAN, IMPLANT, PAIRS } from './targets';

const layers: [string, Layer][] = [GAUSSIAN, ERFC, IMPLANT, DRIVEN, PAIRS].map((target) => [
  target.driveInC ? 'driven implant' : target.profile,
  layerOfTarget(target, target.densityPerCm3),
]);

/** An independent way: the trapezoid over 200 000 strips, the junction by walking down, no law of the shape used. */
function byTrapezoid(layer: Layer): number {
  const background = layer.backgroundDensityPerCm3 ?? 0;
  const [strips, deepest] = [200_000, 3];
  const step = deepest / strips;
  let [sum, before] = [0, 0];
  for (let i = 0; i <= strips; i++) {
    const density = layerDensity(layer, i * step);
    const total = density + background;
    const here =
      density > background ? (density - background) / total / standardResistivity(layer.dopant, total) : 0;
    if (i > 0) sum += ((before + here) / 2) * step;
    before = here;
  }
  return 1 / (sum * 1e-4);
}

describe('the sheet resistance of a layer', () => {
  it.each(layers)('agrees for a %s with a trapezoid of 200 000 strips', (_, layer) => {
    expect(sheetResistance(layer).sheetResistanceOhmSq / byTrapezoid(layer)).toBeCloseTo(1, 7);
  });

  /** Smooth layers by Simpson's rule over 20 000 strips between their ends. */
  function bySimpson(layer: Layer): number {
    const background = layer.backgroundDensityPerCm3 ?? 0;
    const { topUm, junctionUm } = layerExtent(layer);
    const [strips, width] = [20_000, junctionUm - topUm];
    let sum = 0;
    for (let i = 0; i <= strips; i++) {
      const density = layerDensity(layer, topUm + (width * i) / strips);
      const total = density + background;
      const weight = i === 0 || i === strips ? 1 : i % 2 === 1 ? 4 : 2;
      sum += ((density - background) / total / standardResistivity(layer.dopant, total)) * weight;
    }
    return 1 / ((sum * width) / strips / 3 / 1e4);
  }

  it.each(layers.filter(([name]) => name !== 'pairs'))('is integrated for a %s to 1e-8', (_, layer) => {
    expect(Math.abs(sheetResistance(layer).sheetResistanceOhmSq / bySimpson(layer) - 1)).toBeLessThan(1e-8);
  });

  it('steps over arsenic’s own step at 1e19 on its way down', () => {
    const arsenic = layerOfTarget({ ...ERFC, dopant: 'arsenic' }, 1e20);
    expect(sheetResistance(arsenic).sheetResistanceOhmSq / byTrapezoid(arsenic)).toBeCloseTo(1, 5);
  });

  it('is that of a gaussian where it is given as depths and densities, to the straight lines between them', () => {
    const smooth = sheetResistance(layerOfTarget(GAUSSIAN, 1e19));
    const drawn = sheetResistance(layerOfTarget(PAIRS, 1e19));
    // Lines in ln lie inside the parabola: 60 depths leave out 0.06 %.
    expect(drawn.sheetResistanceOhmSq / smooth.sheetResistanceOhmSq).toBeCloseTo(1.0006, 4);
    expect(drawn.junctionDepthUm).toBeCloseTo(smooth.junctionDepthUm, 3);
    expect(drawn.dosePerCm2 / smooth.dosePerCm2).toBeCloseTo(0.999, 3);
  });

  it('falls as the dose rises, for every shape', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...layers),
        fc.double({ min: 1.001, max: 3, noNaN: true }),
        ([, layer], more) => {
          const richer = { ...layer, peakDensityPerCm3: layer.peakDensityPerCm3 * more };
          expect(sheetResistance(richer).sheetResistanceOhmSq).toBeLessThan(
            sheetResistance(layer).sheetResistanceOhmSq,
          );
        },
      ),
      { seed: 11, numRuns: 60 },
    );
  });

  it('of pairs on nothing named ends at the last depth, like a box', () => {
    const { shape, peakDensityPerCm3 } = pairsShape([
      { depthUm: 0, densityPerCm3: 1e19 },
      { depthUm: 0.3, densityPerCm3: 1e19 },
    ]);
    const layer: Layer = {
      ...shape,
      peakDensityPerCm3,
      dopant: 'phosphorus',
      backgroundDopant: null,
      backgroundDensityPerCm3: null,
    };
    expect(sheetResistance(layer).sheetResistanceOhmSq).toBeCloseTo(
      standardResistivity('phosphorus', 1e19) / 3e-5,
      8,
    );
    expect(sheetResistance(layer).dosePerCm2 / 3e14).toBeCloseTo(1, 12);
  });
});

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

describe('a profile of pairs', () => {
  it('runs straight in ln between its depths, level above the first and ends at the last', () => {
    const { shape, peakDensityPerCm3 } = pairsShape([
      { depthUm: 0.1, densityPerCm3: 1e18 },
      { depthUm: 0.3, densityPerCm3: 1e16 },
    ]);
    const at = (depthUm: number): number => layerDensity({ ...shape, peakDensityPerCm3 }, depthUm);
    expect(at(0) / 1e18).toBeCloseTo(1, 12);
    expect(at(0.2) / 1e17).toBeCloseTo(1, 9);
    expect(at(0.3001)).toBe(0);
  });

  it('conducts from the first rise above the background to the first junction under it', () => {
    const { shape, peakDensityPerCm3 } = pairsShape([
      { depthUm: 0, densityPerCm3: 1e14 },
      { depthUm: 0.2, densityPerCm3: 1e18 },
      { depthUm: 0.4, densityPerCm3: 1e14 },
      { depthUm: 0.6, densityPerCm3: 1e18 },
    ]);
    const layer: Layer = {
      ...shape,
      peakDensityPerCm3,
      dopant: 'boron',
      backgroundDopant: 'arsenic',
      backgroundDensityPerCm3: 1e16,
    };
    expect(layerExtent(layer)).toEqual({
      topUm: expect.closeTo(0.1, 12) as number,
      junctionUm: expect.closeTo(0.3, 12) as number,
    });
  });

  it('is refused when it is no profile', () => {
    const at = (...depths: number[]) => depths.map((depthUm) => ({ depthUm, densityPerCm3: 1e18 }));
    expect(() => pairsShape(at(0))).toThrow(/2 to 2000/);
    expect(() => pairsShape(at(0, 0))).toThrow(/rise/);
    expect(() => pairsShape(at(-1, 0))).toThrow(RangeError);
    expect(() => pairsShape([...at(0), { depthUm: 1, densityPerCm3: 0 }])).toThrow(/positive/);
  });
});
