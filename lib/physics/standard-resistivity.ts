import type { Dopant } from './dopant';
import { standardDensityLimits } from './standard-density-limits';
import { FITS_AT_23C, type ResistivityFit } from './standard-fits';
import { standardRange } from './standard-range';

/** The fit that serves a density; throws RangeError where none does, with what a person may do instead. */
function fitAt(dopant: Dopant, densityPerCm3: number): ResistivityFit {
  const range = standardRange(dopant, densityPerCm3);
  if (range !== null) return FITS_AT_23C[range.fit];
  const { lowerPerCm3, upperPerCm3 } = standardDensityLimits(dopant);
  const instead =
    densityPerCm3 > 0 && densityPerCm3 < lowerPerCm3
      ? ' Lighter silicon asks for a model with both carriers.'
      : '';
  throw new RangeError(
    `The standard conversion takes ${dopant} from ${lowerPerCm3.toExponential()} to ${upperPerCm3.toExponential()} per cm³, not ${densityPerCm3}.${instead}`,
  );
}

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
  return fitAt(dopant, densityPerCm3).resistivity(densityPerCm3);
}

/**
 * d ln ρ/d ln N of the standard conversion: the slope of the published fit itself, on the side of a step where the
 * density lies. Source and range as `standardResistivity`; throws RangeError outside.
 *
 * @example standardSensitivity('boron', 1e17) // −0.755
 */
export function standardSensitivity(dopant: Dopant, densityPerCm3: number): number {
  return fitAt(dopant, densityPerCm3).slope(densityPerCm3);
}
