import { mean } from '@/lib/stats/mean';
import { movingRangeSigma } from './moving-range-sigma';
import { baselineOf, estimatorOf, type SigmaSource, type StudyOptions } from './study-chart';

/** A study with a chart that remembers: what is not given comes from the baseline. */
export interface MemoryStudyOptions extends Pick<StudyOptions, 'baseline' | 'estimator'> {
  target?: number;
  sigma?: number;
}

/**
 * Target and σ of an EWMA or CUSUM study: as given, else the mean of the baseline and σ from its moving ranges.
 *
 * Throws `RangeError` for a target that is not finite, a σ that is not positive or comes out as zero, or a baseline
 * that does not fit.
 */
export function memoryScale(
  values: readonly number[],
  options: MemoryStudyOptions,
): { target: number; sigma: number; estimator: SigmaSource } {
  const baseline = baselineOf(values, options.baseline);
  const target = options.target ?? mean(baseline);
  if (!Number.isFinite(target)) throw new RangeError(`no target of ${target}`);
  const known = estimatorOf(options.estimator, ['mean-moving-range', 'median-moving-range']);
  const sigma = options.sigma ?? movingRangeSigma(baseline, known);
  if (!(sigma > 0 && Number.isFinite(sigma))) throw new RangeError(`σ must be positive, not ${sigma}`);
  return { target, sigma, estimator: options.sigma === undefined ? known : 'given' };
}
