import { checkedBackground } from './checked-background';
import { conductingThicknessUm } from './conducting-thickness';
import { densitySensitivity } from './density-sensitivity';
import { diffusivityGrowthPerC } from './diffusivity';
import { implantShare } from './implant-share';
import type { Layer } from './layer';
import { layerExtent } from './layer-extent';
import { layerIntegral } from './layer-integral';
import { layerOfTarget, targetLengthUm } from './layer-of-target';
import { standardResistivity, standardSensitivity } from './standard-resistivity';
import type { ExpectedWafer, Target } from './target';
import { targetDensity } from './target-density';
import { targetCoefficientPercentPerC } from './value-at-temperature';

/** By how many percent a wafer's value moves; null where the cause does not apply or is not known. */
export interface Sensitivities {
  /** Per percent of doping, or of dose: d ln value/d ln density. */
  perPercentDopant: number;
  /** Per °C of the wafer while it is measured. */
  perMeasurementC: number | null;
  /** Per percent of thickness: of the layer, or of the thickness by which a resistivity is computed. */
  perPercentThickness: number | null;
  /** Per °C of the drive-in. */
  perDriveInC: number | null;
}

/** d ln Rs per µm² of spread of an implant: the derivative of its conductance, by that of the density at every depth. */
function spreadSensitivity(layer: Layer): number | null {
  if (layer.profile !== 'implant') return null;
  const background = checkedBackground(layer);
  const extent = layerExtent(layer);
  const weighed = (of: (density: number, total: number, depthUm: number) => number): number =>
    layerIntegral(layer, extent, (density, depthUm) => {
      const total = density + background;
      return of(density, total, depthUm) / total / standardResistivity(layer.dopant, total);
    });
  const slope = weighed((density, total, depthUm) => {
    const net = (density - background) / total;
    const growth = layer.peakDensityPerCm3 * implantShare(layer, depthUm).slopePerUm2;
    return growth * (1 - net * (1 + standardSensitivity(layer.dopant, total)));
  });
  return -slope / weighed((density) => density - background);
}

function thicknessSensitivity(target: Target, densityPerCm3: number, wafer: ExpectedWafer): number | null {
  if (target.quantity === 'resistivity') return 1;
  if (target.profile === 'implant' || target.profile === 'pairs') return null;
  const thicknessUm = targetLengthUm(target, wafer);
  if (thicknessUm === null || target.profile !== 'uniform') return -1;
  return -thicknessUm / conductingThicknessUm(target, densityPerCm3, thicknessUm);
}

function driveInSensitivity(target: Target, densityPerCm3: number): number | null {
  const temperatureC = target.driveInC ?? null;
  if (temperatureC === null || target.profile !== 'implant') return null;
  const layer = layerOfTarget(target, densityPerCm3);
  const perUm2 = spreadSensitivity(layer);
  if (perUm2 === null || layer.profile !== 'implant') return null;
  return 100 * perUm2 * layer.spreadUm2 * diffusivityGrowthPerC(target.dopant, temperatureC);
}

function measurementSensitivity(target: Target, wafer: ExpectedWafer): number | null {
  try {
    return targetCoefficientPercentPerC(target, wafer);
  } catch (error) {
    if (error instanceof RangeError) return null;
    throw error;
  }
}

/**
 * What a percent of dopant, a °C of the wafer, a percent of thickness and a °C of the drive-in do to a wafer's value,
 * each by analytic derivatives at the value itself. A length of a gaussian or erfc counts as its thickness: the shape
 * stretches, the peak stays.
 *
 * Throws RangeError where `modelValue` does.
 *
 * @example sensitivities(boron 1e15, resistivity).perMeasurementC // 0.831
 */
export function sensitivities(target: Target, wafer: ExpectedWafer = {}): Sensitivities {
  const density = targetDensity(target, wafer);
  return {
    perPercentDopant: densitySensitivity(target, density, wafer),
    perMeasurementC: measurementSensitivity(target, wafer),
    perPercentThickness: thicknessSensitivity(target, density, wafer),
    perDriveInC: driveInSensitivity(target, density),
  };
}
