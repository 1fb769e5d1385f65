import { depletionWidth } from './depletion-width';
import { conductionType } from './dopant';
import { isImplantedOrDiffused } from './is-implanted-or-diffused';
import { standardNotes } from './standard-notes';
import type { Target } from './target';

/** What a person should know about an expected value, in whole sentences; empty where there is nothing to say. */
export function expectedNotes(target: Target, densityPerCm3: number): string[] {
  const notes = standardNotes(target.dopant, densityPerCm3);
  if (isImplantedOrDiffused(target) && target.calibrationFactor === null) {
    notes.push(
      'Every dopant atom counts as active. Implanted and diffused layers miss by 5 to 20 % in practice; set a calibration factor from a baseline.',
    );
  }
  if (target.calibrationFactor !== null && target.calibrationPercent === null) {
    notes.push('The calibration factor has no stated uncertainty, so that of the conversion is kept.');
  }
  const { backgroundDopant, backgroundDensityPerCm3: background } = target;
  if (target.profile !== 'uniform' || backgroundDopant === null || background === null) return notes;
  if (conductionType(backgroundDopant) === conductionType(target.dopant)) {
    notes.push(
      'Layer and background are of one type: without a junction between them a four-point probe measures the background.',
    );
  } else if (target.quantity === 'sheet_resistance' && background >= 1e12) {
    const width = depletionWidth(densityPerCm3, background).toFixed(2);
    notes.push(
      `Sheet resistance is ρ/t of the thickness given. Without bias the junction under the layer depletes ${width} µm of it: give the thickness less that, or set a calibration factor.`,
    );
  }
  return notes;
}
