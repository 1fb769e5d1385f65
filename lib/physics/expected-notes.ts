import { isGraded } from './is-graded';
import { standardNotes } from './standard-notes';
import type { Target } from './target';

/** What a person should know about an expected value, in whole sentences; empty where there is nothing to say. */
export function expectedNotes(target: Target, densityPerCm3: number): string[] {
  const notes = standardNotes(target.dopant, densityPerCm3);
  if (isGraded(target) && target.calibrationFactor === null) {
    notes.push(
      'Every dopant atom counts as active. Implanted and diffused layers miss by 5 to 20 % in practice; set a calibration factor from a baseline.',
    );
  }
  if (target.calibrationFactor !== null && target.calibrationPercent === null) {
    notes.push('The calibration factor has no stated uncertainty, so that of the conversion is kept.');
  }
  if (
    target.quantity === 'sheet_resistance' &&
    target.profile === 'uniform' &&
    target.backgroundDopant !== null
  ) {
    notes.push(
      'Sheet resistance is ρ/t of the thickness given. The conducting part of a layer on its junction ends at the depletion edge: give the thickness less that width, or set a calibration factor.',
    );
  }
  return notes;
}
