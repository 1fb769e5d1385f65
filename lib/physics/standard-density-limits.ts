import type { Dopant } from './dopant';
import { standardRanges } from './standard-range';

/** The lowest and highest density, per cm³, that the standard conversion takes for a dopant. */
export function standardDensityLimits(dopant: Dopant): { lowerPerCm3: number; upperPerCm3: number } {
  let [lowerPerCm3, upperPerCm3] = [Infinity, 0];
  for (const range of standardRanges(dopant)) {
    lowerPerCm3 = Math.min(lowerPerCm3, range.lowerPerCm3);
    upperPerCm3 = Math.max(upperPerCm3, range.upperPerCm3);
  }
  return { lowerPerCm3, upperPerCm3 };
}
