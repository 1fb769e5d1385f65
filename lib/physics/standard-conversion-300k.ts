import { monotoneRoot } from './monotone-root';
import { polynomial } from './polynomial';
import { boronFit, phosphorusFit, type ResistivityFit } from './standard-fits';

/** Charge in C with which the fits were made. */
const CHARGE_C = 1.602e-19;

const RANGE = { boron: [1e12, 1e21], phosphorus: [1e12, 5e20] } as const;
const DIRECT_OHM_CM = { boron: [1e-4, 1e4], phosphorus: [2e-4, 4000] } as const;

/** The product qρN of boron falls from 0.02053 to 0.00215 V·s/cm² towards light doping. */
const FITS: Readonly<Record<'boron' | 'phosphorus', ResistivityFit>> = {
  boron: boronFit(0.00215 / CHARGE_C, (0.02053 - 0.00215) / CHARGE_C, 4.09e18, 0.727),
  phosphorus: phosphorusFit([-3.0652, 2.1853, -0.6108, 0.056189], [1, -0.67642, 0.19542, -0.0181]),
};

/**
 * The resistivity, in Ω·cm at 300 K (26.85 °C), of silicon with `densityPerCm3` dopant atoms per cm³, by the fits made
 * at that temperature; mobility models are stated there.
 *
 * Source: NBS Special Publication 400-64 (1981), boron as the product of charge, resistivity and density, phosphorus as
 * a ratio of polynomials. Throws RangeError outside 1e12…1e21 (boron) and 1e12…5e20 per cm³ (phosphorus).
 *
 * @example standardResistivity300K('boron', 1e15) // 13.69
 */
export function standardResistivity300K(dopant: 'boron' | 'phosphorus', densityPerCm3: number): number {
  const [lower, upper] = RANGE[dopant];
  if (!(densityPerCm3 >= lower && densityPerCm3 <= upper)) {
    throw new RangeError(
      `The conversion at 300 K takes ${dopant} from ${lower.toExponential()} to ${upper.toExponential()} per cm³, not ${densityPerCm3}.`,
    );
  }
  return FITS[dopant].resistivity(densityPerCm3);
}

function directDensity(dopant: 'boron' | 'phosphorus', resistivity: number): number {
  if (dopant === 'boron') {
    const product = 0.0022 + (0.01973 - 0.0022) / (1 + (resistivity / 0.01782) ** 1.086);
    return product / (CHARGE_C * resistivity);
  }
  const x = Math.log10(resistivity);
  const z =
    polynomial([-3.0951, -3.2303, -1.2024, -0.13679], x) / polynomial([1, 1.0205, 0.38382, 0.041338], x);
  return (6.242e18 * 10 ** z) / resistivity;
}

/**
 * The dopant density, per cm³, of silicon of a resistivity given in Ω·cm at 300 K, by the direct fit or by turning
 * `standardResistivity300K` round (`'numeric'`), which closes there and back. Source as there. Throws RangeError outside
 * the published range.
 *
 * @example standardDensity300K('boron', 13.69, 'numeric') // 1.00e15
 */
export function standardDensity300K(
  dopant: 'boron' | 'phosphorus',
  resistivityOhmCm: number,
  inverse: 'numeric' | 'direct',
): number {
  const [least, most] = DIRECT_OHM_CM[dopant];
  if (inverse === 'direct') {
    if (resistivityOhmCm >= least && resistivityOhmCm <= most) return directDensity(dopant, resistivityOhmCm);
    throw new RangeError(
      `The direct fit of ${dopant} takes ${least} to ${most} Ω·cm, not ${resistivityOhmCm}.`,
    );
  }
  const [lower, upper] = RANGE[dopant];
  const within = (ln: number): number => Math.min(upper, Math.max(lower, Math.exp(ln)));
  const root =
    resistivityOhmCm > 0 && Number.isFinite(resistivityOhmCm)
      ? monotoneRoot(
          (ln) => Math.log(standardResistivity300K(dopant, within(ln)) / resistivityOhmCm),
          Math.log(lower),
          Math.log(upper),
          1e-13,
        )
      : null;
  if (root === null) {
    throw new RangeError(`No ${dopant} density of the conversion gives ${resistivityOhmCm} Ω·cm at 300 K.`);
  }
  return within(root);
}
