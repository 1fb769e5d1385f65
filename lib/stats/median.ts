import { medianSorted } from 'simple-statistics';
import { assertFiniteSample } from './assert-finite-sample';

/**
 * The middle value of a sample, or the mean of the two in the middle. Half the readings could be wild without
 * moving it far.
 *
 * Throws `RangeError` for an empty sample or a value that is not finite.
 *
 * @example median([5, 1, 9]) // 5
 */
export function median(sample: ArrayLike<number>): number {
  assertFiniteSample(sample);
  if (sample.length === 0) throw new RangeError('an empty sample has no median');
  const value = medianSorted(Array.from(Float64Array.from(sample).sort()));
  if (!Number.isFinite(value))
    throw new RangeError('the two middle values add up to more than a double can hold');
  return value;
}
