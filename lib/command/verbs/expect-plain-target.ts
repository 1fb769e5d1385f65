import type { Dopant } from '@/lib/physics/dopant';
import type { Target } from '@/lib/physics/target';

/** A target of uniform silicon with nothing else said of it: no tolerance, thickness, substrate or calibration. */
export function plainTarget(quantity: Target['quantity'], dopant: Dopant, densityPerCm3: number): Target {
  return {
    quantity,
    dopant,
    densityPerCm3,
    tolerancePercent: null,
    alongCrystal: false,
    profile: 'uniform',
    lengthUm: null,
    backgroundDopant: null,
    backgroundDensityPerCm3: null,
    calibrationFactor: null,
    calibrationPercent: null,
  };
}
