import { deviations } from './deviations';

/**
 * The arithmetic mean, summed from the first value on, so that a large common level costs no digits and equal
 * values give back exactly that value.
 *
 * Throws `RangeError` for an empty sample or a value that is not finite.
 *
 * @example mean([1, 2, 6]) // 3
 */
export function mean(sample: ArrayLike<number>): number {
  const { origin, values } = deviations(sample);
  return origin + meanDeviation(values);
}

/** The mean of distances from the origin: a compensated sum (W. Kahan, Comm. ACM 8, 40 (1965)) over their number. */
export function meanDeviation(values: Float64Array): number {
  let sum = 0;
  let lost = 0;
  for (const value of values) {
    const next = value - lost;
    const total = sum + next;
    lost = total - sum - next;
    sum = total;
  }
  return sum / values.length;
}
