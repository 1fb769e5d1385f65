import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Layer } from '@/lib/physics/layer';
import { layerDensity } from '@/lib/physics/layer-density';
import { layerExtent } from '@/lib/physics/layer-extent';
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
