import { targetDriveIn } from './layer-of-target';
import type { Target } from './target';

/**
 * Whether only the order of magnitude of a target's value is known: its drive-in lies beyond the classical law, and no
 * calibration with an uncertainty of its own carries it. `modelValue` gives that order; `expectedValue` refuses it.
 * Throws RangeError for half a drive-in, or one of another profile than an implant.
 */
export function isOrderOfMagnitude(target: Target): boolean {
  if (target.calibrationFactor !== null && target.calibrationPercent !== null) return false;
  return targetDriveIn(target, target.densityPerCm3)?.isClassical === false;
}
