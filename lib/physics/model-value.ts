import { isUniform } from './is-uniform';
import { sheetResistance } from './sheet-resistance';
import { standardResistivity } from './standard-resistivity';
import type { ExpectedWafer, Target } from './target';

/**
 * What the probe should read on a wafer whose (peak) density is `densityPerCm3`, by physics alone: Ω·cm for a
 * resistivity, Ω/□ for a sheet resistance, at 23 °C. The density is the wafer's own: the crystal's law has been
 * applied before.
 *
 * Throws RangeError outside the standard conversion, for a missing thickness, and for the resistivity of a graded
 * layer, which has no single one.
 */
export function modelValue(target: Target, densityPerCm3: number, wafer: ExpectedWafer = {}): number {
  if (target.quantity === 'resistivity') {
    if (!isUniform(target)) throw new RangeError(`A ${target.profile} layer has no single resistivity.`);
    return standardResistivity(target.dopant, densityPerCm3);
  }
  const lengthUm = (isUniform(target) ? wafer.layerThicknessUm : null) ?? target.lengthUm;
  if (lengthUm === null) throw new RangeError('A sheet resistance needs the layer thickness.');
  if (!(lengthUm > 0 && Number.isFinite(lengthUm))) {
    throw new RangeError(`A layer thickness is a positive number of µm, not ${lengthUm}.`);
  }
  // A uniform layer is ρ/t whatever lies under it: its thickness is the conducting one.
  if (target.profile === 'uniform')
    return standardResistivity(target.dopant, densityPerCm3) / (lengthUm * 1e-4);
  return sheetResistance({
    profile: target.profile,
    dopant: target.dopant,
    peakDensityPerCm3: densityPerCm3,
    lengthUm,
    backgroundDopant: target.backgroundDopant,
    backgroundDensityPerCm3: target.backgroundDensityPerCm3,
  }).sheetResistanceOhmSq;
}
