import { coefficientDisagreementPercentPerC } from './coefficient-disagreement';
import { isCompensated } from './compensated-target';
import { ionizedFraction } from './ionized-fraction';
import { isImplantedOrDiffused } from './is-implanted-or-diffused';
import { isUniform } from './is-uniform';
import { standardResistivity } from './standard-resistivity';
import type { ExpectedWafer, Target } from './target';
import { targetDensity } from './target-density';
import { isNear23C } from './temperature-coefficient';
import { boundedPart, normalPart, type UncertaintyPart } from './uncertainty-budget';
import { targetCoefficientPercentPerC } from './value-at-temperature';

/** How a wafer's temperature was known when it was measured. */
export interface MeasuredTemperature {
  temperatureC: number;
  /** Standard uncertainty of that, in °C. */
  uncertaintyC: number;
}

/** What two sources of the coefficient of uniform silicon make of the way to 23 °C. */
function coefficientPart(target: Target, densityPerCm3: number, fromReferenceC: number): UncertaintyPart[] {
  if (!isUniform(target) || isImplantedOrDiffused(target) || isCompensated(target)) return [];
  const disagreement = coefficientDisagreementPercentPerC(
    target.dopant,
    standardResistivity(target.dopant, densityPerCm3),
  );
  if (disagreement === null) return [];
  return [
    boundedPart(
      'temperature coefficient',
      Math.abs(disagreement) * Math.abs(fromReferenceC),
      true,
      'two sources of one laboratory differ: Bullis and others (1968), NBS SP 400-64 (1981)',
    ),
  ];
}

/** Far from 23 °C: what the share of ionized dopant would change, which the Arora model leaves out. */
function ionizationPart(target: Target, densityPerCm3: number, temperatureC: number): UncertaintyPart[] {
  const there = ionizedFraction(target.dopant, densityPerCm3, temperatureC + 273.15);
  const here = ionizedFraction(target.dopant, densityPerCm3, 296.15);
  if (there === null || here === null) return [];
  return [
    boundedPart(
      'incomplete ionization',
      100 * Math.abs(Math.log(there / here)),
      true,
      'Altermatt and others (2006), against every dopant ionized',
    ),
  ];
}

/**
 * The parts that a wafer's temperature brings to a budget: how well it was known, times the coefficient; and how well
 * the coefficient is known, times the way to 23 °C. None where the reading is said to be at 23 °C already.
 *
 * Throws RangeError for an uncertainty that is negative, and where the target's coefficient ends.
 */
export function temperatureParts(
  target: Target,
  measured: MeasuredTemperature,
  wafer: ExpectedWafer = {},
): UncertaintyPart[] {
  const { temperatureC, uncertaintyC } = measured;
  const density = targetDensity(target, wafer);
  const perC = targetCoefficientPercentPerC(target, wafer);
  const parts = [
    normalPart(
      'wafer temperature',
      Math.abs(perC) * uncertaintyC,
      false,
      'the coefficient times what is not known of the temperature',
    ),
  ];
  const hasOwn = (target.temperatureCoefficientPercentPerC ?? null) !== null;
  if (temperatureC === 23 || hasOwn) return parts;
  return [
    ...parts,
    ...coefficientPart(target, density, temperatureC - 23),
    ...(isNear23C(temperatureC) ? [] : ionizationPart(target, density, temperatureC)),
  ];
}
