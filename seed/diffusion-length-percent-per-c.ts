import { diffusivityGrowthPerC } from '@/lib/physics/diffusivity';
import type { Dopant } from '@/lib/physics/dopant';

/**
 * How much a diffusion length grows per °C of furnace temperature, in percent: the length is √(D·t), so it grows by half
 * of what the diffusivity does.
 *
 * @example diffusionLengthPercentPerC('phosphorus', 900) // 1.54
 */
export function diffusionLengthPercentPerC(dopant: Dopant, setPointC: number): number {
  return 50 * diffusivityGrowthPerC(dopant, setPointC);
}
