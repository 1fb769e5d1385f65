import { checkedBackground } from './checked-background';
import { compensatedSensitivity, isCompensated } from './compensated-target';
import { conductingThicknessUm } from './conducting-thickness';
import { depletionSensitivity } from './depletion-width';
import type { Layer } from './layer';
import { layerExtent } from './layer-extent';
import { layerIntegral } from './layer-integral';
import { layerOfTarget, targetLengthUm } from './layer-of-target';
import { standardResistivity, standardSensitivity } from './standard-resistivity';
import type { ExpectedWafer, Target } from './target';

/**
 * d ln Rs/d ln dose of a layer, its shape unchanged: the conductance's own derivative by the integral of
 * N·∂σ/∂N, with σ = (N − B)/(T·ρ(T)) and T = N + B. The junction moves, but nothing conducts there.
 */
export function layerSensitivity(layer: Layer): number {
  const background = checkedBackground(layer);
  const extent = layerExtent(layer);
  const { dopant } = layer;
  const weighed = (of: (density: number, total: number) => number): number =>
    layerIntegral(layer, extent, (density) => {
      const total = density + background;
      return of(density, total) / total / standardResistivity(dopant, total);
    });
  const conductance = weighed((density) => density - background);
  const slope = weighed((density, total) => {
    const net = (density - background) / total;
    return density * (1 - net * (1 + standardSensitivity(dopant, total)));
  });
  return -slope / conductance;
}

/** d ln value/d ln density of a uniform layer of known thickness: that of ρ, and the depleted part that shrinks. */
function grownSensitivity(target: Target, densityPerCm3: number, wafer: ExpectedWafer): number {
  const own = standardSensitivity(target.dopant, densityPerCm3);
  const [thicknessUm, background] = [targetLengthUm(target, wafer), target.backgroundDensityPerCm3];
  if (thicknessUm === null || background === null) return own;
  const conductingUm = conductingThicknessUm(target, densityPerCm3, thicknessUm);
  if (conductingUm === thicknessUm) return own;
  const depletedShare = (thicknessUm - conductingUm) / conductingUm;
  return own + depletedShare * depletionSensitivity(densityPerCm3, background);
}

/**
 * d ln value / d ln density of a target's model at a density: −1 in lightly doped silicon, about −0.5 near
 * 1e18 per cm³; of a layer per percent of dose. Divide a percent change of the reading by it to read a percent change
 * of dopant. Analytic: the slope of the published fits, carried through the layer's integral; of compensated silicon a
 * difference.
 *
 * Throws RangeError where `modelValue` does.
 *
 * @example densitySensitivity(boronAt1e17, 1e17) // −0.755
 */
export function densitySensitivity(target: Target, densityPerCm3: number, wafer: ExpectedWafer = {}): number {
  if (isCompensated(target)) return compensatedSensitivity(target, densityPerCm3, wafer);
  if (target.quantity === 'resistivity') return standardSensitivity(target.dopant, densityPerCm3);
  if (target.profile === 'uniform') return grownSensitivity(target, densityPerCm3, wafer);
  return layerSensitivity(layerOfTarget(target, densityPerCm3, wafer));
}
