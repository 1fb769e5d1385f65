import type { Layer } from './layer';

const SHARE = { box: 1, gaussian: Math.sqrt(Math.PI) / 2, erfc: 1 / Math.sqrt(Math.PI) } as const;

/**
 * The layer's dopant atoms per cm² of wafer, from the surface down without end: peak·L·√π/2 for a gaussian,
 * peak·L/√π for an erfc, peak·thickness for a box (the integrals of the three shapes).
 *
 * @example layerDose({ profile: 'gaussian', peakDensityPerCm3: 1e19, lengthUm: 0.5 }) // 4.431e14
 */
export function layerDose(layer: Pick<Layer, 'profile' | 'peakDensityPerCm3' | 'lengthUm'>): number {
  return layer.peakDensityPerCm3 * layer.lengthUm * 1e-4 * SHARE[layer.profile];
}
