import type { Dopant } from './dopant';

interface Ionization {
  energyEv: number;
  reference: number;
  c: number;
  band: number;
  d: number;
  degeneracy: number;
}

const PARAMETERS: Readonly<Record<Exclude<Dopant, 'antimony'>, Ionization>> = {
  phosphorus: { energyEv: 0.0455, reference: 3e18, c: 2, band: 6e18, d: 2.3, degeneracy: 1 / 2 },
  arsenic: { energyEv: 0.0537, reference: 4e18, c: 1.5, band: 1.4e19, d: 3, degeneracy: 1 / 2 },
  boron: { energyEv: 0.04439, reference: 1.7e18, c: 1.4, band: 6e18, d: 2.4, degeneracy: 1 / 4 },
};

const BOLTZMANN_EV = 8.617333262e-5;

/**
 * The share of dopant atoms that give a free carrier, from 0 to 1, at a temperature in K; null for antimony, for which
 * no set is published.
 *
 * It serves carrier densities only: resistivity by the standard conversion holds incomplete ionization already.
 * Source: Altermatt, Schenk, Geelhaar and Heiser, J. Appl. Phys. 100, 113714 and 113715 (2006), with the band densities
 * of Green, J. Appl. Phys. 67, 2944 (1990). Throws RangeError unless density and temperature are positive.
 *
 * @example ionizedFraction('boron', 1e18, 300) // 0.764
 */
export function ionizedFraction(dopant: Dopant, densityPerCm3: number, temperatureK: number): number | null {
  if (!(densityPerCm3 > 0 && temperatureK > 0 && Number.isFinite(densityPerCm3 * temperatureK))) {
    throw new RangeError(`Density and temperature are positive, not ${densityPerCm3} and ${temperatureK}.`);
  }
  if (dopant === 'antimony') return null;
  const p = PARAMETERS[dopant];
  const t = temperatureK / 300;
  const energy = p.energyEv / (1 + (densityPerCm3 / p.reference) ** p.c);
  const bound = 1 / (1 + (densityPerCm3 / p.band) ** p.d);
  const bandDensity = dopant === 'boron' ? 3.1e19 * t ** 1.85 : 2.86e19 * t ** 1.58;
  const own = p.degeneracy * bandDensity * Math.exp(-energy / (BOLTZMANN_EV * temperatureK));
  const b = own - densityPerCm3 * (1 - bound);
  const product = densityPerCm3 * own;
  const root = Math.sqrt(b * b + 4 * product);
  // The form without cancellation: for b > 0 the difference of root and b would lose its digits.
  const carriers = b > 0 ? (2 * product) / (root + b) : (root - b) / 2;
  return carriers / densityPerCm3;
}
