import { standardDensityLimits } from './standard-density-limits';
import type { Target } from './target';

/**
 * The lowest and highest density, per cm³, for which `modelValue` of a target is defined. Over a background the
 * conversion is asked at the sum of both dopings, and the layer must be the heavier of the two.
 */
export function modelDensityLimits(target: Target): { lowerPerCm3: number; upperPerCm3: number } {
  const { lowerPerCm3, upperPerCm3 } = standardDensityLimits(target.dopant);
  const background = target.backgroundDensityPerCm3;
  if (background === null || target.profile === 'uniform' || target.quantity === 'resistivity') {
    return { lowerPerCm3, upperPerCm3 };
  }
  return {
    lowerPerCm3: Math.max(lowerPerCm3, background * (1 + 1e-6)),
    upperPerCm3: upperPerCm3 - background,
  };
}
