import type { Target } from '@/lib/physics/target';

/** The plainest target there is: boron, 1 × 10¹⁵ cm⁻³ throughout, its resistivity read. */
export const uniformBoron: Target = {
  quantity: 'resistivity',
  dopant: 'boron',
  densityPerCm3: 1e15,
  tolerancePercent: null,
  alongCrystal: false,
  profile: 'uniform',
  lengthUm: null,
  backgroundDopant: null,
  backgroundDensityPerCm3: null,
  calibrationFactor: null,
  calibrationPercent: null,
};
