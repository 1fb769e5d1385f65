import { expectedValue } from '@/lib/physics/expected-value';
import { missingForExpected } from '@/lib/physics/missing-for-expected';
import type { ExpectedWafer, Target } from '@/lib/physics/target';
import { targetDensity } from '@/lib/physics/target-density';

/** What a target says of every wafer alike, as ratios to the expected value. */
export interface TargetModel {
  /** The expected value where it is the same for all wafers, in the unit of the quantity; else null. */
  value: number | null;
  /** Standard uncertainty (k = 1) of what is expected. */
  uncertaintyPercent: number;
  /** d ln value / d ln density. */
  sensitivity: number;
  /** What the target sets for these wafers; of a graded layer at its peak. */
  densityPerCm3: number;
  /** The values at the edges of the tolerance over the expected one; null where none is agreed or the model ends. */
  toleranceLowerRatio: number | null;
  toleranceUpperRatio: number | null;
}

/** At which a layer is worked out whose thickness each wafer brings. */
const THICK_UM = 100;

/** Working out a diffused layer takes milliseconds: each target is worked out once. */
const known = new Map<string, TargetModel | null>();
const MOST_KNOWN = 2000;

/**
 * What physics makes of a target; along a crystal at a place. A layer whose thickness each wafer brings has no value of
 * its own; its ratios are those of a thick one, of which the junction depletes next to nothing. Null outside the conversion, and without a place where one is
 * needed.
 */
export function targetModel(target: Target, ingotFraction: number | null): TargetModel | null {
  const key = JSON.stringify([target, target.alongCrystal ? ingotFraction : null]);
  const found = known.get(key);
  if (found !== undefined) return found;
  const model = worked(target, ingotFraction);
  if (known.size >= MOST_KNOWN) known.clear();
  known.set(key, model);
  return model;
}

function worked(target: Target, ingotFraction: number | null): TargetModel | null {
  const wafer: ExpectedWafer = { ingotFraction };
  const missing = missingForExpected(target, wafer);
  if (missing === 'ingotFraction') return null;
  try {
    const given = missing === 'layerThicknessUm' ? { ...wafer, layerThicknessUm: THICK_UM } : wafer;
    const { value, uncertaintyPercent, sensitivity, toleranceLower, toleranceUpper } = expectedValue(
      target,
      given,
    );
    if (sensitivity === 0) return null;
    return {
      value: missing === null && !target.alongCrystal ? value : null,
      uncertaintyPercent,
      sensitivity,
      densityPerCm3: targetDensity(target, wafer),
      toleranceLowerRatio: toleranceLower && toleranceLower / value,
      toleranceUpperRatio: toleranceUpper && toleranceUpper / value,
    };
  } catch (error) {
    if (error instanceof RangeError) return null;
    throw error;
  }
}
