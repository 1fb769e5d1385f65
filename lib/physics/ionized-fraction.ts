import type { Dopant } from './dopant';
import { ionizationTerms } from './ionization-terms';

/**
 * The share of dopant atoms that give a free carrier, from 0 to 1, at a temperature in K; null for antimony, for which
 * no set is published.
 *
 * It serves carrier densities only: resistivity by the standard conversion holds incomplete ionization already.
 * Source: as `ionizationTerms`. Throws RangeError unless density and temperature are positive.
 *
 * @example ionizedFraction('boron', 1e18, 300) // 0.764
 */
export function ionizedFraction(dopant: Dopant, densityPerCm3: number, temperatureK: number): number | null {
  const terms = ionizationTerms(dopant, densityPerCm3, temperatureK);
  if (terms === null) return null;
  const b = terms.levelPerCm3 - densityPerCm3 * (1 - terms.bound);
  const product = densityPerCm3 * terms.levelPerCm3;
  const root = Math.sqrt(b * b + 4 * product);
  // The form without cancellation: for b > 0 the difference of root and b would lose its digits.
  const carriers = b > 0 ? (2 * product) / (root + b) : (root - b) / 2;
  return carriers / densityPerCm3;
}
