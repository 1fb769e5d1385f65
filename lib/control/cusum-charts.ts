import { assertFiniteSample } from '@/lib/stats/assert-finite-sample';
import { CUSUM_BEGIN, nextCusum } from './cusum';
import type { CusumDesign } from './cusum-run-length';
import { isBeyond } from './is-beyond';
import { memoryScale, type MemoryStudyOptions } from './memory-study';
import type { StudyChart } from './study-chart';

/**
 * A study by tabular CUSUM of values in time order: one chart of the arm that grows where the level lies above the
 * target, one where it lies below, both from zero up and in the unit of the values, with the decision interval h·σ
 * as their limit. They run on after a signal. NIST/SEMATECH e-Handbook, section 6.3.2.3. `sigma` is that of the
 * values: an arm has no standard deviation to speak of.
 *
 * Throws `RangeError` with fewer than two values, one that is not finite, unless 0 ≤ k and 0 < h, and for what
 * `memoryScale` refuses.
 */
export function cusumCharts(
  values: readonly number[],
  design: CusumDesign,
  options: MemoryStudyOptions,
): StudyChart[] {
  const { reference, decision } = design;
  if (!(reference >= 0 && Number.isFinite(reference)))
    throw new RangeError(`no reference value of ${reference} σ`);
  if (!(decision > 0 && Number.isFinite(decision)))
    throw new RangeError(`no decision interval of ${decision} σ`);
  assertFiniteSample(values);
  const { target, sigma, estimator } = memoryScale(values, options);
  let state = CUSUM_BEGIN;
  const states = values.map((x) => (state = nextCusum(state, (x - target) / sigma, design)));
  return (['above', 'below'] as const).map((side) => {
    const points = states.map((arms) => arms[side] * sigma);
    const upper = decision * sigma;
    return {
      name: `cusum-${side}` as const,
      estimator,
      centre: 0,
      upper,
      lower: 0,
      sigma,
      points,
      signals: points.flatMap((value, i) =>
        isBeyond(value, upper, 'above')
          ? [{ point: i + 1, rule: 'beyond-limit', side, participants: [i + 1] }]
          : [],
      ),
    };
  });
}
