import { describe, expect, it } from 'vitest';
import type { Layer } from '@/lib/physics/layer';
import { layerDensity } from '@/lib/physics/layer-density';
import { layerExtent } from '@/lib/physics/layer-extent';
import { pairsShape } from '@/lib/physics/pairs-shape';

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
