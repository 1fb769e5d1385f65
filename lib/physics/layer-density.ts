import { complementaryErrorFunction } from './complementary-error-function';
import type { Layer } from './layer';

/**
 * The layer's own dopant density, per cm³, at `depthUm` µm below the surface, background not counted.
 *
 * Throws RangeError for a negative depth.
 *
 * @example layerDensity({ profile: 'gaussian', peakDensityPerCm3: 1e19, lengthUm: 0.5, … }, 0.5) // 3.679e18
 */
export function layerDensity(
  layer: Pick<Layer, 'profile' | 'peakDensityPerCm3' | 'lengthUm'>,
  depthUm: number,
): number {
  if (!(depthUm >= 0)) throw new RangeError(`A depth is counted from the surface down, not ${depthUm}.`);
  const u = depthUm / layer.lengthUm;
  if (layer.profile === 'box') return u <= 1 ? layer.peakDensityPerCm3 : 0;
  const share = layer.profile === 'gaussian' ? Math.exp(-u * u) : complementaryErrorFunction(u);
  return layer.peakDensityPerCm3 * share;
}
