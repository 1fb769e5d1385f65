import { conductionType, type Dopant } from './dopant';
import { standardResistivity300K } from './standard-conversion-300k';
import { standardDensity } from './standard-density';
import { hasTemperatureCoefficient, temperatureCoefficientPercentPerC } from './temperature-coefficient';

/**
 * By how much, in percent per °C, two sources of one laboratory differ in the temperature coefficient of a resistivity:
 * the polynomial of 1968 (`temperatureCoefficientPercentPerC`) less what the conversions of 1981 at 23 °C and 300 K
 * imply. Up to 0.13 for boron above 10 Ω·cm. Neither is known to be the better, so the difference counts as a bound.
 *
 * Sources: Bullis and others, Solid-State Electronics 11, 639 (1968); NBS Special Publication 400-64 (1981). For
 * arsenic and antimony the phosphorus data stand in. Null where either ends.
 *
 * @example coefficientDisagreementPercentPerC('boron', 100) // 0.13
 */
export function coefficientDisagreementPercentPerC(dopant: Dopant, resistivityOhmCm: number): number | null {
  const fit = dopant === 'boron' ? 'boron' : 'phosphorus';
  if (!hasTemperatureCoefficient(resistivityOhmCm)) return null;
  const density = standardDensity(fit, resistivityOhmCm, 'numeric');
  const implied = (100 * (standardResistivity300K(fit, density) / resistivityOhmCm - 1)) / 3.85;
  return temperatureCoefficientPercentPerC(conductionType(dopant), resistivityOhmCm) - implied;
}
