import type { Dopant } from './dopant';

const PARAMETERS = {
  phosphorus: { energyEv: 0.0455, reference: 3e18, c: 2, band: 6e18, d: 2.3, degeneracy: 1 / 2 },
  arsenic: { energyEv: 0.0537, reference: 4e18, c: 1.5, band: 1.4e19, d: 3, degeneracy: 1 / 2 },
  boron: { energyEv: 0.04439, reference: 1.7e18, c: 1.4, band: 6e18, d: 2.4, degeneracy: 1 / 4 },
} as const;

const BOLTZMANN_EV = 8.617333262e-5;

/**
 * What decides how many atoms of a dopant are ionized: the share `bound` of them that can hold a carrier at all, and
 * the carrier density `levelPerCm3` at which half of those do.
 *
 * Source: Altermatt, Schenk, Geelhaar and Heiser, J. Appl. Phys. 100, 113714 and 113715 (2006), with the band densities
 * of Green, J. Appl. Phys. 67, 2944 (1990). Null for antimony, for which no set is published. Throws RangeError unless
 * density and temperature are positive.
 */
export function ionizationTerms(
  dopant: Dopant,
  densityPerCm3: number,
  temperatureK: number,
): { bound: number; levelPerCm3: number } | null {
  if (!(densityPerCm3 > 0 && temperatureK > 0 && Number.isFinite(densityPerCm3 * temperatureK))) {
    throw new RangeError(`Density and temperature are positive, not ${densityPerCm3} and ${temperatureK}.`);
  }
  if (dopant === 'antimony') return null;
  const p = PARAMETERS[dopant];
  const t = temperatureK / 300;
  const energyEv = p.energyEv / (1 + (densityPerCm3 / p.reference) ** p.c);
  const bandDensity = dopant === 'boron' ? 3.1e19 * t ** 1.85 : 2.86e19 * t ** 1.58;
  return {
    bound: 1 / (1 + (densityPerCm3 / p.band) ** p.d),
    levelPerCm3: p.degeneracy * bandDensity * Math.exp(-energyEv / (BOLTZMANN_EV * temperatureK)),
  };
}
