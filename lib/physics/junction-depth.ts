import { checkedBackground } from './checked-background';
import type { Layer } from './layer';
import { complementaryErrorFunction } from './complementary-error-function';
import { monotoneRoot } from './monotone-root';

/**
 * How deep, in µm, the layer's doping equals the background's: the metallurgical junction. For a box its
 * thickness.
 *
 * Throws RangeError where `checkedBackground` does.
 *
 * @example a gaussian of 1e19 with L = 0.5 µm in 1e15 of the other type // 1.517
 */
export function junctionDepth(layer: Layer): number {
  const background = checkedBackground(layer);
  if (layer.profile === 'box') return layer.lengthUm;
  const lnRatio = Math.log(layer.peakDensityPerCm3 / background);
  const gaussian = Math.sqrt(lnRatio);
  if (layer.profile === 'gaussian') return layer.lengthUm * gaussian;
  // erfc(u) ≤ exp(−u²), so the root lies at or above no deeper than the gaussian's.
  const u = monotoneRoot((x) => Math.log(complementaryErrorFunction(x)) + lnRatio, 0, gaussian, 1e-13);
  if (u === null) throw new RangeError('The layer has no junction with its background.');
  return layer.lengthUm * u;
}
