import { modelDensityLimits } from './model-density-limits';
import { modelValue } from './model-value';
import { standardRange } from './standard-range';
import type { ExpectedWafer, Target } from './target';

/**
 * d ln value / d ln density of a target's model at a density: −1 in lightly doped silicon, about −0.5 near
 * 1e18 per cm³. Divide a percent change of the reading by it to read a percent change of dopant.
 *
 * By a central difference of ±0.05 %, one-sided at the end of a fit. Throws RangeError where `modelValue` does.
 *
 * @example densitySensitivity(boronAt1e17, 1e17) // −0.755
 */
export function densitySensitivity(target: Target, densityPerCm3: number, wafer: ExpectedWafer = {}): number {
  const limits = modelDensityLimits(target);
  const fit = standardRange(target.dopant, densityPerCm3);
  const uniform = target.profile === 'uniform' || target.quantity === 'resistivity';
  // The step between two fits is no property of the silicon: stay on the side where the density lies.
  const lower = Math.max(
    densityPerCm3 * (1 - 5e-4),
    limits.lowerPerCm3,
    uniform ? (fit?.lowerPerCm3 ?? 0) : 0,
  );
  const upper = Math.min(
    densityPerCm3 * (1 + 5e-4),
    limits.upperPerCm3,
    uniform ? (fit?.upperPerCm3 ?? limits.upperPerCm3) : limits.upperPerCm3,
  );
  return (
    Math.log(modelValue(target, upper, wafer) / modelValue(target, lower, wafer)) / Math.log(upper / lower)
  );
}
