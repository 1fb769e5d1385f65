import { deviations } from './deviations';
import { meanDeviation } from './mean';

/**
 * The sample standard deviation s: the square root of the sum of squared distances from the mean over n − 1.
 * Two passes with the correction term of Chan, Golub and LeVeque (The American Statistician 37, 242 (1983)).
 * In the unit of the values.
 *
 * `null` for a single value, which has no spread. Throws `RangeError` for an empty sample or a value that is
 * not finite.
 *
 * @example sampleStandardDeviation([1, 2, 3]) // 1
 */
export function sampleStandardDeviation(sample: ArrayLike<number>): number | null {
  const { values } = deviations(sample);
  if (values.length < 2) return null;
  const centre = meanDeviation(values);
  let squares = 0;
  let residue = 0;
  for (const value of values) {
    const distance = value - centre;
    squares += distance * distance;
    residue += distance;
  }
  const variance = (squares - (residue * residue) / values.length) / (values.length - 1);
  if (!Number.isFinite(variance)) throw new RangeError('the squared spread is more than a double can hold');
  return Math.sqrt(Math.max(0, variance));
}
