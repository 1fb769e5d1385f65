import { compensatedResistivity, isCompensated } from './compensated-target';
import { conductingThicknessUm, refuseWithoutJunction } from './conducting-thickness';
import { isUniform } from './is-uniform';
import { layerOfTarget, targetLengthUm } from './layer-of-target';
import { sheetResistance } from './sheet-resistance';
import { standardResistivity } from './standard-resistivity';
import type { ExpectedWafer, Target } from './target';

/**
 * What the probe should read on a wafer whose (peak) density is `densityPerCm3`, by physics alone: Ω·cm for a
 * resistivity, Ω/□ for a sheet resistance, at 23 °C. The density is the wafer's own: the crystal's law has been
 * applied before. Compensated silicon goes by a mobility model at the total doping. A uniform layer is ρ/(t − w), w what the junction under it depletes.
 *
 * Throws RangeError outside the standard conversion, for a missing thickness, for the resistivity of a graded
 * layer, which has no single one, and for an epitaxial layer that no four-point probe can measure.
 */
export function modelValue(target: Target, densityPerCm3: number, wafer: ExpectedWafer = {}): number {
  if (target.quantity === 'resistivity') {
    if (!isUniform(target)) throw new RangeError(`A ${target.profile} layer has no single resistivity.`);
    refuseWithoutJunction(target);
    return isCompensated(target)
      ? compensatedResistivity(target, densityPerCm3, wafer)
      : standardResistivity(target.dopant, densityPerCm3);
  }
  if (target.profile !== 'uniform') {
    return sheetResistance(layerOfTarget(target, densityPerCm3, wafer)).sheetResistanceOhmSq;
  }
  const lengthUm = targetLengthUm(target, wafer);
  if (lengthUm === null) throw new RangeError('A sheet resistance needs the layer thickness.');
  const conductingCm = conductingThicknessUm(target, densityPerCm3, lengthUm) * 1e-4;
  return standardResistivity(target.dopant, densityPerCm3) / conductingCm;
}
