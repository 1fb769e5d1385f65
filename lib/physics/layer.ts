import type { Dopant } from './dopant';

/**
 * A doped layer: uniform to `lengthUm` (box), or falling from its peak at the surface as exp(−(x/L)²) (gaussian,
 * a drive-in of a fixed dose) or erfc(x/L) (a diffusion from a constant source), L being `lengthUm`.
 */
export interface Layer {
  profile: 'box' | 'gaussian' | 'erfc';
  dopant: Dopant;
  peakDensityPerCm3: number;
  lengthUm: number;
  backgroundDopant: Dopant | null;
  backgroundDensityPerCm3: number | null;
}
