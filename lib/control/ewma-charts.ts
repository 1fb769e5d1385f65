import { assertFiniteSample } from '@/lib/stats/assert-finite-sample';
import { ewmaBegin, ewmaSigma, nextEwma } from './ewma';
import type { EwmaDesign } from './ewma-run-length';
import { memoryScale, type MemoryStudyOptions } from './memory-study';
import { limitSignals, oneOrMany, type StudyChart } from './study-chart';

/**
 * A study by EWMA of values in time order: the chart of z = λ·x + (1 − λ)·z begun on the target, its limits `width`
 * standard deviations of z away. `steady` limits are those it tends to (the ones run lengths are computed for);
 * `growing` ones are as narrow at the start as z itself varies there, so that an early shift is seen sooner.
 * NIST/SEMATECH e-Handbook, section 6.3.2.4.
 *
 * Throws `RangeError` with fewer than two values, one that is not finite, unless 0 < λ ≤ 1 and 0 < width, and for what
 * `memoryScale` refuses.
 */
export function ewmaCharts(
  values: readonly number[],
  { lambda, width }: EwmaDesign,
  options: MemoryStudyOptions & { limits: 'steady' | 'growing' },
): StudyChart[] {
  if (!(lambda > 0 && lambda <= 1)) throw new RangeError(`λ lies above 0 and up to 1, not at ${lambda}`);
  if (!(width > 0 && Number.isFinite(width))) throw new RangeError(`no limits at ${width} σ`);
  assertFiniteSample(values);
  const { target, sigma, estimator } = memoryScale(values, options);
  let state = ewmaBegin(target);
  const points = values.map((x) => (state = nextEwma(state, x, lambda)).value);
  const own = values.map((_, i) => sigma * ewmaSigma(lambda, options.limits === 'steady' ? null : i + 1));
  const upper = own.map((s) => target + width * s);
  const lower = own.map((s) => target - width * s);
  return [
    {
      name: 'ewma',
      estimator,
      centre: target,
      upper: oneOrMany(upper),
      lower: oneOrMany(lower),
      sigma: oneOrMany(own),
      points,
      signals: limitSignals(points, lower, upper),
    },
  ];
}
