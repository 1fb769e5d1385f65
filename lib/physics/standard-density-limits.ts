import type { Dopant } from './dopant';
import { standardRanges } from './standard-range';

/** The lowest and highest density, per cm³, that the standard conversion takes for a dopant. */
export function standardDensityLimits(dopant: Dopant): { lowerPerCm3: number; upperPerCm3: number } {
  const ranges = standardRanges(dopant);
  return {
    lowerPerCm3: Math.min(...ranges.map((r) => r.lowerPerCm3)),
    upperPerCm3: Math.max(...ranges.map((r) => r.upperPerCm3)),
  };
}
