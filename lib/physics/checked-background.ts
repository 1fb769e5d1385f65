import { conductionType } from './dopant';
import type { Layer } from './layer';

function positive(what: string, value: number): void {
  if (!(value > 0 && Number.isFinite(value)))
    throw new RangeError(`${what} is a positive number, not ${value}.`);
}

/**
 * The background density, per cm³, under a layer that can be measured at all; 0 for a box, or a profile of pairs, on
 * nothing named.
 *
 * A four-point probe needs a junction below the layer: a background of the layer's own type carries the current
 * instead. Throws RangeError for such a background, for one as heavy as the layer, for half a background, for a
 * graded layer without one, and for a peak, length, range or spread that cannot be.
 */
export function checkedBackground(layer: Layer): number {
  const { backgroundDopant: dopant, backgroundDensityPerCm3: density } = layer;
  positive('A peak density', layer.peakDensityPerCm3);
  if (layer.profile !== 'pairs') positive("A layer's length in µm", layer.lengthUm);
  if (
    layer.profile === 'implant' &&
    !(layer.rangeUm >= 0 && layer.spreadUm2 >= 0 && Number.isFinite(layer.rangeUm + layer.spreadUm2))
  ) {
    throw new RangeError(
      `An implant's range and spread are not negative; they are ${layer.rangeUm} µm and ${layer.spreadUm2} µm².`,
    );
  }
  if (dopant === null && density === null) {
    if (layer.profile === 'box' || layer.profile === 'pairs') return 0;
    throw new RangeError(`A layer of ${layer.profile} shape ends at a junction: name its background.`);
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
