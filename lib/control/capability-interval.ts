import { chiSquareQuantile } from '@/lib/stats/chi-square';
import { noncentralTCdf } from '@/lib/stats/noncentral-t';
import { rootBetween } from '@/lib/stats/root-between';
import { standardNormalQuantile } from '@/lib/stats/standard-normal';
import type { Interval } from './limit-interval';

/**
 * The interval of an index that is a fixed width over σ, as Cp and Pp are: chi-square (NIST/SEMATECH e-Handbook,
 * section 6.1.6). The index is taken with the s of its degrees of freedom.
 *
 * Throws `RangeError` unless 0 < confidence < 1 and the degrees of freedom are positive.
 *
 * @example spreadIndexInterval(1, 49).low // √(31.555/49)
 */
export function spreadIndexInterval(index: number, degreesOfFreedom: number, confidence = 0.95): Interval {
  const at = (p: number): number =>
    index * Math.sqrt(chiSquareQuantile(p, degreesOfFreedom) / degreesOfFreedom);
  return { low: at((1 - confidence) / 2), high: at((1 + confidence) / 2) };
}

/**
 * The interval of a distance from the mean of n values to one limit over 3σ, as Cpk and Ppk are once the nearer limit is
 * known: 3√n times the index follows a non-central t about 3√n times the truth (D. B. Owen, Technometrics 10, 445
 * (1968); for capability M. C. Kushler and P. Hurley, J. Quality Technology 24, 188 (1992), from memory). Exact for one
 * limit and for s of all values. Beyond 2000 degrees of freedom the normal form of A. F. Bissell, Applied Statistics 39,
 * 331 (1990): ± z·√(1/(9n) + index²/(2ν)).
 *
 * Throws `RangeError` unless 0 < confidence < 1, n is at least 2 and the degrees of freedom are positive.
 */
export function distanceIndexInterval(
  index: number,
  n: number,
  degreesOfFreedom: number,
  confidence = 0.95,
): Interval {
  if (!(n >= 2)) throw new RangeError(`no interval from ${n} values`);
  const z = standardNormalQuantile((1 + confidence) / 2);
  const error = Math.sqrt(1 / (9 * n) + index ** 2 / (2 * degreesOfFreedom));
  if (degreesOfFreedom > 2000) return { low: index - z * error, high: index + z * error };
  const scale = 3 * Math.sqrt(n);
  const truth = (p: number): number =>
    rootBetween(
      (trial) => noncentralTCdf(scale * index, degreesOfFreedom, scale * trial) - p,
      index - 4 * error,
      index + 4 * error,
    );
  return { low: truth((1 + confidence) / 2), high: truth((1 - confidence) / 2) };
}

/**
 * The interval of Cpm, which counts the distance from the target as spread: chi-square with the degrees of freedom
 * n·(1 + ξ²)²/(1 + 2ξ²), ξ the distance in σ (R. A. Boyles, J. Quality Technology 23, 17 (1991), from memory).
 *
 * Throws `RangeError` unless 0 < confidence < 1 and n is positive.
 */
export function targetIndexInterval(
  index: number,
  n: number,
  distanceInSigma: number,
  confidence = 0.95,
): Interval {
  const square = distanceInSigma ** 2;
  return spreadIndexInterval(index, (n * (1 + square) ** 2) / (1 + 2 * square), confidence);
}
