import type { Layer } from './layer';
import { layerDensity } from './layer-density';
import { layerExtent, type LayerExtent } from './layer-extent';
import type { DepthDensity } from './pairs-shape';

/** A layer as it is drawn: its own density against depth, what lies under it, and between which depths it conducts. */
export interface DrawnLayer extends LayerExtent {
  points: DepthDensity[];
  backgroundPerCm3: number | null;
}

/** How far below its junction a layer is drawn, over the junction's depth. */
const BEYOND = 1.3;

/**
 * A layer's profile from the surface to somewhat below its junction, `count` evenly spaced depths: for drawing. A box, and
 * a profile of pairs, are drawn to their end. A density too small for a number is left out.
 *
 * Throws RangeError where `layerExtent` does, and for fewer than two depths.
 *
 * @example layerProfile(gaussian boron 1e19, L = 0.5 µm, in 1e15, 100).junctionUm // 1.517
 */
export function layerProfile(layer: Layer, count: number): DrawnLayer {
  if (!(Number.isInteger(count) && count >= 2)) {
    throw new RangeError(`A profile is drawn through two depths or more, not ${count}.`);
  }
  const extent = layerExtent(layer);
  const last = layer.profile === 'pairs' ? (layer.steps.at(-1)?.depthUm ?? 0) : extent.junctionUm;
  const endUm = layer.profile === 'box' || layer.profile === 'pairs' ? last : BEYOND * extent.junctionUm;
  const points = Array.from({ length: count }, (_, i) => {
    const depthUm = i === count - 1 ? endUm : (endUm * i) / (count - 1);
    return { depthUm, densityPerCm3: layerDensity(layer, depthUm) };
  }).filter(({ densityPerCm3 }) => densityPerCm3 > 0);
  return { ...extent, points, backgroundPerCm3: layer.backgroundDensityPerCm3 };
}
