import type { Dopant } from './dopant';

/**
 * How a layer's doping runs in depth, as shares of its peak:
 * `box` uniform to `lengthUm` · `gaussian` exp(−(x/L)²), a drive-in of a fixed dose · `erfc` erfc(x/L), a diffusion from
 * a constant source · `implant` a gaussian about its projected range, straggle `lengthUm`, spread since by a drive-in ·
 * `pairs` a measured or simulated profile, straight in ln of the density between its depths.
 */
export type LayerShape =
  | { profile: 'box' | 'gaussian' | 'erfc'; lengthUm: number }
  | ImplantShape
  | { profile: 'pairs'; steps: readonly DepthShare[] };

/** `spreadUm2` is twice diffusivity times time, in µm²; 0 as implanted. */
export interface ImplantShape {
  profile: 'implant';
  rangeUm: number;
  lengthUm: number;
  spreadUm2: number;
}

/** One depth of a profile and the natural logarithm of its share of the peak. */
export interface DepthShare {
  depthUm: number;
  lnShare: number;
}

/** A doped layer on what lies under it; an implant's peak is that before its drive-in. */
export type Layer = LayerShape & {
  dopant: Dopant;
  peakDensityPerCm3: number;
  backgroundDopant: Dopant | null;
  backgroundDensityPerCm3: number | null;
};
