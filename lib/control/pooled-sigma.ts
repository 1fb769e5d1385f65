import { c4 } from '@/lib/stats/c4';
import { sampleStandardDeviation } from '@/lib/stats/sample-standard-deviation';

/**
 * σ within subgroups from their pooled standard deviation √(Σ(nᵢ − 1)·sᵢ² / Σ(nᵢ − 1)), its bias taken out by c4 of
 * one more than the degrees of freedom (I. W. Burr, J. Quality Technology 1, 163 (1969), from memory). It uses
 * subgroups of any size best of all, as long as all have the same σ.
 *
 * Throws `RangeError` when no subgroup has two values, or a value is not finite.
 */
export function pooledSigma(subgroups: readonly (readonly number[])[]): number {
  let squares = 0;
  let freedom = 0;
  for (const values of subgroups) {
    const s = sampleStandardDeviation(values);
    if (s === null) continue;
    squares += (values.length - 1) * s * s;
    freedom += values.length - 1;
  }
  if (freedom === 0) throw new RangeError('no subgroup of the baseline has two values');
  return Math.sqrt(squares / freedom) / c4(freedom + 1);
}
