import type { Dopant } from './dopant';

/**
 * Equilibrium segregation coefficient of a dopant in silicon: density in the solid over density in the melt.
 * The values in general use, seen in one public text for this project; published ones scatter by some percent.
 */
export const SEGREGATION_COEFFICIENT: Readonly<Record<Dopant, number>> = {
  boron: 0.8,
  phosphorus: 0.35,
  arsenic: 0.3,
  antimony: 0.023,
};

/**
 * The dopant density, per cm³, at the solidified fraction g of a crystal that began with `seedDensityPerCm3` at
 * its seed end: Cs(g) = Cs(0)·(1 − g)^(k − 1).
 *
 * It is why resistivity falls along a crystal with nothing wrong: a charted value must be taken relative to it.
 * Normal freezing, melt fully mixed, no evaporation: E. Scheil, Zeitschrift für Metallkunde 34, 70 (1942).
 *
 * Throws RangeError unless 0 ≤ `fraction` < 1 and the density is positive.
 *
 * @example scheilDensity('phosphorus', 1e15, 0.5) // 1.569e15
 */
export function scheilDensity(dopant: Dopant, seedDensityPerCm3: number, fraction: number): number {
  if (!(fraction >= 0 && fraction < 1)) {
    throw new RangeError(`A solidified fraction lies from 0 to below 1, not at ${fraction}.`);
  }
  if (!(seedDensityPerCm3 > 0 && Number.isFinite(seedDensityPerCm3))) {
    throw new RangeError(`A dopant density is a positive number per cm³, not ${seedDensityPerCm3}.`);
  }
  return seedDensityPerCm3 * (1 - fraction) ** (SEGREGATION_COEFFICIENT[dopant] - 1);
}
