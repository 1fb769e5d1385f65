import { COMPENSATED_MODEL, isCompensated } from './compensated-target';
import { densitySensitivity } from './density-sensitivity';
import { expectedNotes } from './expected-notes';
import { expectedUncertaintyPercent } from './expected-uncertainty';
import { targetDriveIn } from './layer-of-target';
import { modelDensityLimits } from './model-density-limits';
import { modelValue } from './model-value';
import type { ExpectedWafer, Target } from './target';
import { targetDensity } from './target-density';

/** What physics expects a probe to read, and how well it knows. */
export interface Expected {
  /** In Ω·cm or Ω/□ at 23 °C; calibrated where the target has a factor. */
  value: number;
  /** The same without the factor. */
  fromPhysics: number;
  /** Standard uncertainty (k = 1) of `value`, in percent, common to all wafers of a stream. */
  uncertaintyPercent: number;
  /** The lower value within the tolerance, most often at more dopant; null without one, or where the model ends before it. */
  toleranceLower: number | null;
  /** The higher value within the tolerance. */
  toleranceUpper: number | null;
  /** d ln value / d ln density; negative but for silicon in which the counter dopant leads. */
  sensitivity: number;
  model: string;
  notes: string[];
}

/** A drive-in that no classical law describes gives no band, unless a calibration with its own uncertainty does. */
function refuseOrderOfMagnitude(target: Target, densityPerCm3: number, fromPhysics: number): void {
  const drive = targetDriveIn(target, densityPerCm3);
  if (drive === null || drive.isClassical) return;
  if (target.calibrationFactor !== null && target.calibrationPercent !== null) return;
  throw new RangeError(
    `At ${target.driveInC} °C the dopant's peak of ${densityPerCm3.toExponential(1)} per cm³ exceeds the intrinsic density, ${drive.intrinsicPerCm3.toExponential(1)}: the classical diffusivity fails and only an order of magnitude is known, about ${fromPhysics.toPrecision(1)} Ω/□. Give a calibration factor with its uncertainty, or the profile itself.`,
  );
}

/**
 * What a wafer should read by its target: the value, its standard uncertainty, and the band the target tolerates.
 *
 * The two are kept apart: the tolerance says what is accepted, the uncertainty how well the value is known, and
 * neither is ever added to the other (JCGM 106:2012). The chart draws one as a band, the other as lines.
 *
 * Throws RangeError outside the standard conversion's densities, for a missing thickness or solidified fraction
 * (`missingForExpected` tells beforehand), for a drive-in beyond the classical law without a calibration, and for a tolerance or calibration factor that cannot be.
 *
 * @example expectedValue(boron 1e15, resistivity, uniform).value // 13.306
 */
export function expectedValue(target: Target, wafer: ExpectedWafer = {}): Expected {
  const factor = target.calibrationFactor ?? 1;
  if (!(factor > 0 && Number.isFinite(factor))) {
    throw new RangeError(`A calibration factor is a positive number, not ${factor}.`);
  }
  const tolerance = target.tolerancePercent;
  if (tolerance !== null && !(tolerance >= 0 && tolerance < 100)) {
    throw new RangeError(`A tolerance lies from 0 to below 100 percent, not at ${tolerance}.`);
  }
  const density = targetDensity(target, wafer);
  const fromPhysics = modelValue(target, density, wafer);
  refuseOrderOfMagnitude(target, density, fromPhysics);
  const limits = tolerance === null ? null : modelDensityLimits(target, wafer);
  const at = (share: number): number | null => {
    const shifted = density * share;
    if (limits === null) return null;
    if (shifted < limits.lowerPerCm3 || shifted > limits.upperPerCm3) return null;
    return factor * modelValue(target, shifted, wafer);
  };
  const sensitivity = densitySensitivity(target, density, wafer);
  const [atMore, atLess] = [at(1 + (tolerance ?? 0) / 100), at(1 - (tolerance ?? 0) / 100)];
  return {
    value: factor * fromPhysics,
    fromPhysics,
    uncertaintyPercent: expectedUncertaintyPercent(target),
    toleranceLower: sensitivity < 0 ? atMore : atLess,
    toleranceUpper: sensitivity < 0 ? atLess : atMore,
    sensitivity,
    model: isCompensated(target) ? COMPENSATED_MODEL : 'standard',
    notes: expectedNotes(target, density, wafer),
  };
}
