import { isCompensated } from './compensated-target';
import { missingForExpected } from './missing-for-expected';
import { modelDensityLimits } from './model-density-limits';
import { modelValue } from './model-value';
import { monotoneRoot } from './monotone-root';
import type { ExpectedWafer, Target } from './target';

/**
 * The dopant density, per cm³, that would make a wafer of this target read `measured`: the doping scale beside a
 * chart, and "+2.1 % dopant" beside a wafer. It is the density in that wafer (the peak of a graded layer), so along
 * a crystal it compares with `targetDensity`, not with the seed end. The calibration factor is divided out.
 *
 * A reading within arsenic's step at 1e19 per cm³, which no density gives, is put at the step.
 *
 * `measured` in Ω·cm or Ω/□ at 23 °C, as the target's quantity. Null where no density of the conversion gives it,
 * where the thickness is missing, and for a reading that is not positive.
 *
 * @example densityFromMeasured(boron, resistivity, uniform; 13.306) // 1e15
 */
export function densityFromMeasured(
  target: Target,
  measured: number,
  wafer: ExpectedWafer = {},
): number | null {
  const reading = measured / (target.calibrationFactor ?? 1);
  if (!(reading > 0 && Number.isFinite(reading))) return null;
  const known = isCompensated(target) ? wafer : { ...wafer, ingotFraction: 0 };
  if (missingForExpected(target, known) !== null) return null;
  const { lowerPerCm3, upperPerCm3 } = modelDensityLimits(target, wafer);
  const excess = (lnDensity: number): number => {
    const density = Math.min(upperPerCm3, Math.max(lowerPerCm3, Math.exp(lnDensity)));
    return Math.log(modelValue(target, density, wafer) / reading);
  };
  const root = monotoneRoot(excess, Math.log(lowerPerCm3), Math.log(upperPerCm3), 1e-12);
  return root === null ? null : Math.min(upperPerCm3, Math.max(lowerPerCm3, Math.exp(root)));
}
