import { compensatedResistivity, isCompensated } from './compensated-target';
import { conductionType } from './dopant';
import { isImplantedOrDiffused } from './is-implanted-or-diffused';
import { layerCoefficient, layerTemperatureRatio } from './layer-temperature';
import { layerOfTarget } from './layer-of-target';
import { resistivityAtTemperature } from './resistivity-at-temperature';
import { standardDensity } from './standard-density';
import { standardResistivity } from './standard-resistivity';
import type { ExpectedWafer, Target } from './target';
import { targetDensity } from './target-density';
import { isNear23C, resistivityAt23C, temperatureCoefficientPercentPerC } from './temperature-coefficient';

/**
 * How a target's value moves with the wafer's temperature near 23 °C, in percent per °C: the owner's own coefficient
 * where one is set, else that of the resistivity (ASTM F84 / SEMI MF84), of a graded layer that of its profile.
 *
 * Throws RangeError where the model of the target ends, or its coefficient.
 *
 * @example targetCoefficientPercentPerC(boron 1e15, resistivity) // 0.831
 */
export function targetCoefficientPercentPerC(target: Target, wafer: ExpectedWafer = {}): number {
  const own = target.temperatureCoefficientPercentPerC ?? null;
  if (own !== null) {
    if (!(Math.abs(own) <= 2))
      throw new RangeError(`A temperature coefficient lies within ±2 % per °C, not at ${own}.`);
    return own;
  }
  const density = targetDensity(target, wafer);
  if (isCompensated(target)) {
    const at = (celsius: number): number => compensatedResistivity(target, density, wafer, celsius);
    return (100 * (at(23.5) - at(22.5))) / at(23);
  }
  if (isImplantedOrDiffused(target))
    return layerCoefficient(layerOfTarget(target, density, wafer)).percentPerC;
  return temperatureCoefficientPercentPerC(
    conductionType(target.dopant),
    standardResistivity(target.dopant, density),
  );
}

/** A value at 23 °C over that at the wafer's temperature. */
function towards23C(target: Target, temperatureC: number, wafer: ExpectedWafer): number {
  if (isNear23C(temperatureC)) {
    return 1 - (targetCoefficientPercentPerC(target, wafer) / 100) * (temperatureC - 23);
  }
  if ((target.temperatureCoefficientPercentPerC ?? null) !== null) {
    throw new RangeError(
      `The owner's temperature coefficient serves from 18 to 28 °C, not at ${temperatureC}.`,
    );
  }
  const density = targetDensity(target, wafer);
  if (isCompensated(target)) {
    const at = (celsius: number): number => compensatedResistivity(target, density, wafer, celsius);
    return at(23) / at(temperatureC);
  }
  if (isImplantedOrDiffused(target)) {
    return 1 / layerTemperatureRatio(layerOfTarget(target, density, wafer), temperatureC);
  }
  const at23C = standardResistivity(target.dopant, density);
  return at23C / resistivityAtTemperature(target.dopant, density, at23C, temperatureC);
}

/** Uniform silicon near 23 °C has the coefficient of the resistivity measured, not of the one aimed at. */
function goesByItsOwnSize(target: Target, temperatureC: number): boolean {
  const own = target.temperatureCoefficientPercentPerC ?? null;
  const isPlain = target.quantity === 'resistivity' && !isCompensated(target);
  return isPlain && own === null && isNear23C(temperatureC);
}

/**
 * A value measured on a wafer of a target at `temperatureC`, brought to 23 °C, in its own unit.
 *
 * A resistivity of uniform silicon goes by its own size, whatever the target is; a layer by its profile; outside 18 to
 * 28 °C by the ratio of the Arora model. Throws RangeError outside −23…66 °C and where the target's model ends.
 *
 * @example valueAt23C(boron 1e15, 13.4, 24) // 13.289
 */
export function valueAt23C(
  target: Target,
  measured: number,
  temperatureC: number,
  wafer: ExpectedWafer = {},
): number {
  return goesByItsOwnSize(target, temperatureC)
    ? resistivityAt23C(conductionType(target.dopant), measured, temperatureC)
    : measured * towards23C(target, temperatureC, wafer);
}

/**
 * What a wafer whose value at 23 °C is known should read at another temperature: `valueAt23C` turned round.
 *
 * @example valueAtTemperature(boron 1e15, 13.306, 25) // 13.53
 */
export function valueAtTemperature(
  target: Target,
  at23C: number,
  temperatureC: number,
  wafer: ExpectedWafer = {},
): number {
  if (!goesByItsOwnSize(target, temperatureC)) return at23C / towards23C(target, temperatureC, wafer);
  const density = standardDensity(target.dopant, at23C, 'numeric');
  return resistivityAtTemperature(target.dopant, density, at23C, temperatureC);
}
