import { expectedValue } from '@/lib/physics/expected-value';
import { missingForExpected } from '@/lib/physics/missing-for-expected';
import type { ExpectedWafer, Target } from '@/lib/physics/target';
import { mean } from '@/lib/stats/mean';
import { sampleStandardDeviation } from '@/lib/stats/sample-standard-deviation';
import type { StreamKind } from '@/lib/streams/types';
import type { CalibrationWafer } from './data';

/** What a baseline says of a model: measured over model, and how well that is known. */
export interface CalibrationFactor {
  factor: number;
  /** Standard uncertainty of the factor, in percent of it. */
  percent: number;
  /** Standard deviation of the subgroups' ratios, in percent of the factor. */
  spreadPercent: number;
  subgroups: number;
  wafers: number;
}

/**
 * The calibration factor that a baseline sets: the mean over its subgroups of measured over model, and the standard
 * uncertainty of that mean, s/√n (JCGM 100:2008, 4.2.3; subgroups taken as independent, the wafers within one are not).
 * A wafer counts with its own thickness only where the layer is grown, as it does when it is judged.
 *
 * Null with fewer than two subgroups of which physics can expect anything.
 */
export function calibrationFactor(
  target: Target,
  kind: StreamKind,
  wafers: readonly CalibrationWafer[],
): CalibrationFactor | null {
  const physics: Target = { ...target, calibrationFactor: null, calibrationPercent: null };
  const ofSubgroup = new Map<string, number[]>();
  for (const { subgroupId, measured, ingotFraction, thicknessUm } of wafers) {
    const wafer = { ingotFraction, layerThicknessUm: kind === 'epi' ? thicknessUm : null };
    const model = expectedOrNull(physics, wafer);
    if (model === null) continue;
    const ratio = measured / model;
    ofSubgroup.set(subgroupId, [...(ofSubgroup.get(subgroupId) ?? []), ratio]);
  }
  const ratios = [...ofSubgroup.values()].map((of) => mean(of));
  const s = ratios.length < 2 ? null : sampleStandardDeviation(ratios);
  if (s === null) return null;
  const factor = mean(ratios);
  return {
    factor,
    percent: (100 * s) / Math.sqrt(ratios.length) / factor,
    spreadPercent: (100 * s) / factor,
    subgroups: ratios.length,
    wafers: [...ofSubgroup.values()].reduce((sum, of) => sum + of.length, 0),
  };
}

/** What physics expects of a wafer; null where something it needs is missing, or the conversion ends before it. */
function expectedOrNull(target: Target, wafer: ExpectedWafer): number | null {
  if (missingForExpected(target, wafer) !== null) return null;
  try {
    return expectedValue(target, wafer).value;
  } catch (error) {
    if (error instanceof RangeError) return null;
    throw error;
  }
}
