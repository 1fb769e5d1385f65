import { densityFromMeasured } from './density-from-measured';
import { expectedOrNull } from './expected-or-null';
import type { Expected } from './expected-value';
import type { ExpectedWafer, Target } from './target';
import { targetDensity } from './target-density';

/** A measured wafer beside what physics expects of it, in the reading and in dopant. Uncertainties are standard ones, k = 1. */
export interface AgainstExpected {
  expected: Expected;
  /** 100 · (measured / expected − 1). */
  differencePercent: number;
  /** Of the difference: what is not known of the expected value, seen from there. */
  differenceUncertaintyPercent: number;
  /** What the target sets for this wafer, and what the reading stands for; null where no density gives it. */
  targetDensityPerCm3: number;
  densityPerCm3: number | null;
  /** 100 · (density / target density − 1), and its uncertainty through d ln value / d ln density. */
  dopantPercent: number | null;
  dopantUncertaintyPercent: number;
}

/**
 * Holds one measured value against what physics expects: the difference in the reading and as dopant, both with the
 * standard uncertainty of the expected value carried on (JCGM 100:2008, 5.1.2). The gauge's own is not in it.
 *
 * `measured` in Ω·cm or Ω/□ at 23 °C. Null where the target lacks something the wafer does not bring, or lies outside
 * the conversion. Throws RangeError for a reading that is not positive.
 *
 * @example againstExpected(boron 1e15, 13.04).differencePercent // −2.0, dopantPercent +2.1
 */
export function againstExpected(
  target: Target,
  measured: number,
  wafer: ExpectedWafer = {},
): AgainstExpected | null {
  if (!(measured > 0 && Number.isFinite(measured))) {
    throw new RangeError(`A measured value is positive, not ${measured}.`);
  }
  const expected = expectedOrNull(target, wafer);
  if (expected === null) return null;
  const ratio = measured / expected.value;
  const targetDensityPerCm3 = targetDensity(target, wafer);
  const densityPerCm3 = densityFromMeasured(target, measured, wafer);
  return {
    expected,
    differencePercent: 100 * (ratio - 1),
    differenceUncertaintyPercent: ratio * expected.uncertaintyPercent,
    targetDensityPerCm3,
    densityPerCm3,
    dopantPercent: densityPerCm3 === null ? null : 100 * (densityPerCm3 / targetDensityPerCm3 - 1),
    dopantUncertaintyPercent:
      ((densityPerCm3 ?? targetDensityPerCm3) / targetDensityPerCm3) *
      (expected.uncertaintyPercent / Math.abs(expected.sensitivity)),
  };
}
