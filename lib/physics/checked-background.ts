import { conductionType } from './dopant';
import type { Layer } from './layer';

/**
 * The background density, per cm³, under a layer that can be measured at all; 0 for a box on nothing named.
 *
 * A four-point probe needs a junction below the layer: a background of the layer's own type carries the current
 * instead. Throws RangeError for such a background, for one as heavy as the layer, for half a background, for a
 * graded layer without one, and for a peak or length that is not positive.
 */
export function checkedBackground(layer: Layer): number {
  const { backgroundDopant: dopant, backgroundDensityPerCm3: density } = layer;
  if (!(layer.peakDensityPerCm3 > 0 && Number.isFinite(layer.peakDensityPerCm3))) {
    throw new RangeError(`A peak density is a positive number per cm³, not ${layer.peakDensityPerCm3}.`);
  }
  if (!(layer.lengthUm > 0 && Number.isFinite(layer.lengthUm))) {
    throw new RangeError(`A layer's length is a positive number of µm, not ${layer.lengthUm}.`);
  }
  if (dopant === null && density === null) {
    if (layer.profile === 'box') return 0;
    throw new RangeError(`A ${layer.profile} layer ends at a junction: name its background.`);
  }
  if (dopant === null || density === null) {
    throw new RangeError('A background needs both its dopant and its density.');
  }
  if (conductionType(dopant) === conductionType(layer.dopant)) {
    throw new RangeError(
      `${layer.dopant} on ${dopant} makes no junction: a probe would measure the background, not the layer.`,
    );
  }
  if (!(density > 0 && density < layer.peakDensityPerCm3)) {
    throw new RangeError(
      `The background must be doped, and lighter than the layer's peak; it is ${density}.`,
    );
  }
  return density;
}
