import { expectedValue } from '@/lib/physics/expected-value';
import { isOrderOfMagnitude } from '@/lib/physics/is-order-of-magnitude';
import { missingForExpected } from '@/lib/physics/missing-for-expected';
import type { Target } from '@/lib/physics/target';
import type { TargetFields } from './target-fields';

/** What keeps a target from being one, and the field of the form where it is mended. */
export interface TargetFault {
  field: keyof TargetFields;
  reason: string;
}

/**
 * Why a target cannot stand, in physics' own words where physics says so. A drive-in of which only the order of magnitude
 * is known can: a calibration needs its wafers first.
 */
export function targetFault(target: Target): TargetFault | null {
  const ingotFraction = target.alongCrystal ? 0 : null;
  return (
    halfFault(target) ??
    lackFault(target, ingotFraction) ??
    physicsFault(
      isOrderOfMagnitude(target) ? { ...target, calibrationFactor: 1, calibrationPercent: 0 } : target,
      ingotFraction,
    )
  );
}

function halfFault(target: Target): TargetFault | null {
  const isHalf = (a: unknown, b: unknown) => (a ?? null) === null && (b ?? null) !== null;
  const { backgroundDopant, backgroundDensityPerCm3, counterDopant, counterDensityPerCm3 } = target;
  const pairs = [
    ['backgroundDopant', backgroundDopant, backgroundDensityPerCm3, BACKGROUND],
    ['backgroundDensityPerCm3', backgroundDensityPerCm3, backgroundDopant, BACKGROUND],
    ['counterDopant', counterDopant, counterDensityPerCm3, COUNTER],
    ['counterDensityPerCm3', counterDensityPerCm3, counterDopant, COUNTER],
    ['driveInC', target.driveInC, target.driveInMin, DRIVE_IN],
    ['driveInMin', target.driveInMin, target.driveInC, DRIVE_IN],
    ['calibrationFactor', target.calibrationFactor, target.calibrationPercent, CALIBRATION],
  ] as const;
  const half = pairs.find(([, value, other]) => isHalf(value, other));
  return half === undefined ? null : { field: half[0], reason: half[3] };
}

const BACKGROUND = 'A background has a dopant and a density: give both or neither.';
const COUNTER = 'A second dopant has its kind and its density: give both or neither.';
const DRIVE_IN = 'A drive-in has a temperature and a time: give both or neither.';
const CALIBRATION = 'An uncertainty belongs to a factor: give both or neither.';

function lackFault(target: Target, ingotFraction: number | null): TargetFault | null {
  const { profile } = target;
  if (profile === 'pairs' && !target.pairs) {
    return { field: 'pairs', reason: 'Give the profile: a line for each depth.' };
  }
  if (profile === 'implant' && target.lengthUm === null) {
    return { field: 'lengthUm', reason: 'An implant needs its straggle.' };
  }
  if (profile === 'implant' && (target.rangeUm ?? null) === null) {
    return { field: 'rangeUm', reason: 'An implant needs its projected range.' };
  }
  if (missingForExpected(target, { ingotFraction }) === 'layerThicknessUm' && profile !== 'uniform') {
    return { field: 'lengthUm', reason: `A ${profile} layer needs its length.` };
  }
  const isGraded = profile === 'gaussian' || profile === 'erfc' || profile === 'implant';
  if (isGraded && target.quantity === 'sheet_resistance' && target.backgroundDopant === null) {
    const what = profile === 'implant' ? 'An implanted' : `A ${profile}`;
    return { field: 'backgroundDopant', reason: `${what} layer ends at a junction: say on what.` };
  }
  return null;
}

/** A layer whose thickness each wafer brings is asked about at this one: a junction leaves some of it. */
const THICK_UM = 100;

function physicsFault(target: Target, ingotFraction: number | null): TargetFault | null {
  try {
    expectedValue(target, { ingotFraction, layerThicknessUm: target.lengthUm ?? THICK_UM });
    return null;
  } catch (error) {
    if (error instanceof RangeError) return { field: 'densityPerCm3', reason: error.message };
    throw error;
  }
}
