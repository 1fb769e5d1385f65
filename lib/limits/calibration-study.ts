import { expectedOrNull } from '@/lib/physics/expected-or-null';
import { missingForExpected } from '@/lib/physics/missing-for-expected';
import type { Target } from '@/lib/physics/target';
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

/** A calibration, where the span holds enough for one, and the wafers of the span that could not serve in it. */
export interface CalibrationStudy {
  found: CalibrationFactor | null;
  /** Wafers that lack what physics needs to know of them: a place along the crystal, or a thickness. */
  lacking: number;
  /** Wafers of which the conversion says nothing: it ends before them. */
  beyond: number;
}

/**
 * The calibration factor that a baseline sets: the mean over its subgroups of measured over model, and the standard
 * uncertainty of that mean, s/√n (JCGM 100:2008, 4.2.3; subgroups taken as independent, the wafers within one are not).
 * A wafer counts with its own thickness only where the layer is grown, as it does when it is judged.
 *
 * There is none with fewer than two subgroups of which physics can expect anything.
 */
export function calibrationStudy(
  target: Target,
  kind: StreamKind,
  wafers: readonly CalibrationWafer[],
): CalibrationStudy {
  // A factor of one is physics alone, also where physics without a factor is an order of magnitude only.
  const physics: Target = { ...target, calibrationFactor: 1, calibrationPercent: 0 };
  const ofSubgroup = new Map<string, number[]>();
  const left = { lacking: 0, beyond: 0 };
  for (const { subgroupId, measured, ingotFraction, thicknessUm } of wafers) {
    const wafer = { ingotFraction, layerThicknessUm: kind === 'epi' ? thicknessUm : null };
    const model = expectedOrNull(physics, wafer);
    if (model === null) {
      left[missingForExpected(physics, wafer) === null ? 'beyond' : 'lacking'] += 1;
      continue;
    }
    const ratio = measured / model.value;
    ofSubgroup.set(subgroupId, [...(ofSubgroup.get(subgroupId) ?? []), ratio]);
  }
  const ratios = [...ofSubgroup.values()].map((of) => mean(of));
  const s = ratios.length < 2 ? null : sampleStandardDeviation(ratios);
  if (s === null) return { found: null, ...left };
  const factor = mean(ratios);
  const found = {
    factor,
    percent: (100 * s) / Math.sqrt(ratios.length) / factor,
    spreadPercent: (100 * s) / factor,
    subgroups: ratios.length,
    wafers: [...ofSubgroup.values()].reduce((sum, of) => sum + of.length, 0),
  };
  return { found, ...left };
}
