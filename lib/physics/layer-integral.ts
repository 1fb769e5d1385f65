import { adaptiveIntegral } from './adaptive-integral';
import type { Layer } from './layer';
import { layerDensity } from './layer-density';
import type { LayerExtent } from './layer-extent';

/** Relative tolerance of the quadrature. */
const TOLERANCE = 1e-9;

/**
 * The integral over a layer's conducting part, in cm, of something that depends on its own density and on depth in µm.
 * Kinks of the shape, a profile's depths and an implant's range, are ends of pieces, so that each piece is smooth.
 */
export function layerIntegral(
  layer: Layer,
  { topUm, junctionUm }: LayerExtent,
  of: (densityPerCm3: number, depthUm: number) => number,
): number {
  if (layer.profile === 'box') return of(layer.peakDensityPerCm3, 0) * junctionUm * 1e-4;
  const kinks =
    layer.profile === 'pairs'
      ? layer.steps.map(({ depthUm }) => depthUm)
      : layer.profile === 'implant'
        ? [layer.rangeUm]
        : [];
  const inside = kinks.filter((depth) => depth > topUm && depth < junctionUm);
  let [sum, from] = [0, topUm];
  const at = (depthUm: number): number => of(layerDensity(layer, depthUm), depthUm);
  for (const to of [...inside, junctionUm]) {
    sum += adaptiveIntegral(at, from, to, TOLERANCE);
    from = to;
  }
  return sum * 1e-4;
}
