import { COMPENSATED_MODEL, compensatedDoping, isCompensated } from './compensated-target';
import { conductingThicknessUm } from './conducting-thickness';
import { densitySensitivity } from './density-sensitivity';
import { isImplantedOrDiffused } from './is-implanted-or-diffused';
import { layerExtent } from './layer-extent';
import { layerOfTarget, targetDriveIn, targetLengthUm } from './layer-of-target';
import { mobilityNotes } from './mobility-notes';
import { standardNotes } from './standard-notes';
import type { ExpectedWafer, Target } from './target';

/** What a person should know about an expected value, in whole sentences; empty where there is nothing to say. */
export function expectedNotes(target: Target, densityPerCm3: number, wafer: ExpectedWafer = {}): string[] {
  const notes = isCompensated(target)
    ? compensatedNotes(target, densityPerCm3, wafer)
    : standardNotes(target.dopant, densityPerCm3);
  if (isImplantedOrDiffused(target) && target.calibrationFactor === null) {
    notes.push(
      'Every dopant atom counts as active. Implanted and diffused layers miss by 5 to 20 % in practice; set a calibration factor from a baseline.',
    );
  }
  if (target.calibrationFactor !== null && target.calibrationPercent === null) {
    notes.push('The calibration factor has no stated uncertainty, so that of the conversion is kept.');
  }
  const drive = targetDriveIn(target, densityPerCm3);
  if (drive !== null && !drive.isClassical) {
    const what =
      target.calibrationFactor === null
        ? 'an order of magnitude only, no band'
        : 'from physics an order of magnitude only; the calibration carries the value';
    notes.push(
      `The dopant exceeds the intrinsic density at the drive-in, ${drive.intrinsicPerCm3.toExponential(1)} per cm³, where the classical diffusivity fails: ${what}.`,
    );
  }
  if (target.quantity === 'sheet_resistance' && target.profile === 'uniform') {
    notes.push(...grownNotes(target, densityPerCm3, wafer));
  }
  if (target.profile === 'implant' || target.profile === 'pairs') {
    const { topUm } = layerExtent(layerOfTarget(target, densityPerCm3, wafer));
    if (topUm > 0) {
      notes.push(
        `The layer lies buried ${topUm.toFixed(3)} µm under silicon of the background's type: pins on the surface do not meet it alone.`,
      );
    }
  }
  return notes;
}

function compensatedNotes(target: Target, densityPerCm3: number, wafer: ExpectedWafer): string[] {
  const perPercent = densitySensitivity(target, densityPerCm3, wafer).toPrecision(3);
  return [
    ...mobilityNotes(COMPENSATED_MODEL, compensatedDoping(target, densityPerCm3, wafer)),
    `The dopants partly cancel: 1 % more ${target.dopant} moves it by ${perPercent} %. What is not known of either density moves it as much.`,
  ];
}

function grownNotes(target: Target, densityPerCm3: number, wafer: ExpectedWafer): string[] {
  const thicknessUm = targetLengthUm(target, wafer);
  if (thicknessUm === null || target.backgroundDopant === null) return [];
  const depletedUm = thicknessUm - conductingThicknessUm(target, densityPerCm3, thicknessUm);
  if (depletedUm > 0) {
    return [
      `Without bias the junction under the layer depletes ${depletedUm.toFixed(2)} µm of it; the rest conducts.`,
    ];
  }
  return target.method === 'other'
    ? ['Measured by another method than a four-point probe: the whole thickness counts.']
    : [];
}
