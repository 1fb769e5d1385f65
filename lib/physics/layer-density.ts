import { complementaryErrorFunction } from './complementary-error-function';
import { implantShare } from './implant-share';
import type { DepthShare, LayerShape } from './layer';

function pairsShare(steps: readonly DepthShare[], depthUm: number): number {
  let [low, high] = [0, steps.length - 1];
  const [first, last] = [steps[low], steps[high]];
  if (first === undefined || last === undefined || depthUm > last.depthUm) return 0;
  if (depthUm <= first.depthUm) return Math.exp(first.lnShare);
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if ((steps[middle]?.depthUm ?? 0) < depthUm) low = middle;
    else high = middle;
  }
  const [a, b] = [steps[low] ?? first, steps[high] ?? last];
  return Math.exp(a.lnShare + ((b.lnShare - a.lnShare) * (depthUm - a.depthUm)) / (b.depthUm - a.depthUm));
}

function layerShare(shape: LayerShape, depthUm: number): number {
  switch (shape.profile) {
    case 'box':
      return depthUm <= shape.lengthUm ? 1 : 0;
    case 'gaussian':
      return Math.exp(-((depthUm / shape.lengthUm) ** 2));
    case 'erfc':
      return complementaryErrorFunction(depthUm / shape.lengthUm);
    case 'implant':
      return implantShare(shape, depthUm).share;
    case 'pairs':
      return pairsShare(shape.steps, depthUm);
  }
}

/**
 * The layer's own dopant density, per cm³, at `depthUm` µm below the surface, background not counted.
 *
 * Throws RangeError for a negative depth.
 *
 * @example layerDensity({ profile: 'gaussian', peakDensityPerCm3: 1e19, lengthUm: 0.5, … }, 0.5) // 3.679e18
 */
export function layerDensity(layer: LayerShape & { peakDensityPerCm3: number }, depthUm: number): number {
  if (!(depthUm >= 0)) throw new RangeError(`A depth is counted from the surface down, not ${depthUm}.`);
  return layer.peakDensityPerCm3 * layerShare(layer, depthUm);
}
