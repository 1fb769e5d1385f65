import type { Dopant } from './dopant';
import { monotoneRoot } from './monotone-root';
import { polynomial } from './polynomial';
import { standardRanges } from './standard-range';
import { standardResistivity } from './standard-resistivity';

/** Resistivities, in Ω·cm, over which the direct fits were published. */
const DIRECT_RANGE = { boron: [1e-4, 1e4], phosphorus: [2e-4, 4000] } as const;

const PHOSPHORUS_NUMERATOR = [-3.1083, -3.2626, -1.2196, -0.13923];
const PHOSPHORUS_DENOMINATOR = [1, 1.0265, 0.38755, 0.041833];

function boronDensity(resistivity: number): number {
  return 1.33e16 / resistivity + 1.082e17 / (resistivity * (1 + (54.56 * resistivity) ** 1.105));
}

function phosphorusDensity(resistivity: number): number {
  const x = Math.log10(resistivity);
  const z = polynomial(PHOSPHORUS_NUMERATOR, x) / polynomial(PHOSPHORUS_DENOMINATOR, x);
  return (6.242e18 * 10 ** z) / resistivity;
}

function directDensity(dopant: Dopant, resistivity: number): number {
  const fit = dopant === 'boron' ? 'boron' : 'phosphorus';
  const [lower, upper] = DIRECT_RANGE[fit];
  if (!(resistivity >= lower && resistivity <= upper)) {
    throw new RangeError(`The direct fit of ${fit} takes ${lower} to ${upper} Ω·cm, not ${resistivity}.`);
  }
  const density = fit === 'boron' ? boronDensity(resistivity) : phosphorusDensity(resistivity);
  if (fit !== dopant && density > 1e19) {
    throw new RangeError(
      `No direct fit is published for ${dopant} above 1e19 per cm³; use the numeric inverse.`,
    );
  }
  return density;
}

function numericDensity(dopant: Dopant, resistivity: number): number {
  if (!(resistivity > 0 && Number.isFinite(resistivity))) {
    throw new RangeError(`A resistivity is a positive number of Ω·cm, not ${resistivity}.`);
  }
  const target = Math.log(resistivity);
  const excess = (lnDensity: number, lower: number, upper: number): number =>
    // exp(ln N) may land a rounding outside the range it came from.
    Math.log(standardResistivity(dopant, Math.min(upper, Math.max(lower, Math.exp(lnDensity))))) - target;
  for (const { lowerPerCm3: lower, upperPerCm3: upper } of standardRanges(dopant)) {
    const root = monotoneRoot((x) => excess(x, lower, upper), Math.log(lower), Math.log(upper), 1e-13);
    if (root !== null) return Math.min(upper, Math.max(lower, Math.exp(root)));
  }
  throw new RangeError(`No ${dopant} density of the standard conversion gives ${resistivity} Ω·cm at 23 °C.`);
}

/**
 * The dopant density, per cm³, of silicon of a resistivity given in Ω·cm at 23 °C.
 *
 * `'numeric'` turns `standardResistivity` round, so that there and back closes. `'direct'` is the fit published
 * for this direction, made to the same data on its own: it differs by up to 2.7 % (boron) and 7.1 % (phosphorus,
 * near 2e18), so a figure must say which of the two it is. No arsenic density gives a resistivity within the step
 * between the two fits that serve it, 5.555e-3 to 5.775e-3 Ω·cm.
 *
 * Source: ASTM F723 / SEMI MF723, after NBS Special Publication 400-64 (1981).
 *
 * Throws RangeError outside the published range, and for a direct fit that does not exist.
 *
 * @example standardDensity('boron', 10, 'direct') // 1.340e15
 */
export function standardDensity(
  dopant: Dopant,
  resistivityOhmCm: number,
  inverse: 'numeric' | 'direct',
): number {
  return inverse === 'direct'
    ? directDensity(dopant, resistivityOhmCm)
    : numericDensity(dopant, resistivityOhmCm);
}
