import type { Dopant } from './dopant';
import { polynomial } from './polynomial';
import { standardDensityLimits } from './standard-density-limits';
import { standardRange } from './standard-range';

/** 1/q in 1/C as the published fit of phosphorus writes it. */
const RECIPROCAL_CHARGE = 6.242e18;

const PHOSPHORUS_NUMERATOR = [-3.0769, 2.2108, -0.62272, 0.057501];
const PHOSPHORUS_DENOMINATOR = [1, -0.68157, 0.19833, -0.018376];

const ARSENIC = [
  -6633.667, 768.2531, -25.77373, 0.9658177, -0.05643443, -8.008543e-4, 9.055838e-5, -1.776701e-6,
  1.953279e-7, -5.754599e-9, -1.31657e-11,
];

function boronResistivity(density: number): number {
  return 1.305e16 / density + 1.133e17 / (density * (1 + (2.58e-19 * density) ** -0.737));
}

function phosphorusResistivity(density: number): number {
  const x = Math.log10(density) - 16;
  const z = polynomial(PHOSPHORUS_NUMERATOR, x) / polynomial(PHOSPHORUS_DENOMINATOR, x);
  return (RECIPROCAL_CHARGE * 10 ** z) / density;
}

function arsenicResistivity(density: number): number {
  return 10 ** polynomial(ARSENIC, Math.log10(density));
}

const fits = { boron: boronResistivity, phosphorus: phosphorusResistivity, arsenic: arsenicResistivity };

/**
 * The resistivity, in Ω·cm at 23 °C, of silicon that holds `densityPerCm3` atoms of one dopant per cm³.
 *
 * It is what a wafer's doping target promises the probe will read. The fit is of resistivity against dopant
 * atoms, so incomplete ionization is already inside it.
 *
 * Source: ASTM F723 / SEMI MF723, after Thurber, Mattis, Liu and Filliben, NBS Special Publication 400-64
 * (1981); self-consistent within 3 % (boron) and 4.5 % (phosphorus). Which fit serves which dopant, and where:
 * `standardRanges`.
 *
 * Throws RangeError outside the published range of densities.
 *
 * @example standardResistivity('boron', 1e15) // 13.306
 */
export function standardResistivity(dopant: Dopant, densityPerCm3: number): number {
  const range = standardRange(dopant, densityPerCm3);
  if (range === null) {
    const { lowerPerCm3, upperPerCm3 } = standardDensityLimits(dopant);
    throw new RangeError(
      `The standard conversion takes ${dopant} from ${lowerPerCm3.toExponential()} to ${upperPerCm3.toExponential()} per cm³, not ${densityPerCm3}.`,
    );
  }
  return fits[range.fit](densityPerCm3);
}
