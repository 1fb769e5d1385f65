import { betaCdf } from './beta-distribution';
import { rootBetween } from './root-between';

/**
 * The part of Student's t distribution that lies below t: half an incomplete beta function (Abramowitz and Stegun,
 * 26.7.1), small tails to their own digits.
 *
 * Throws `RangeError` unless t is finite and the degrees of freedom are finite and positive.
 *
 * @example studentTCdf(1, 1) // 0.75
 */
export function studentTCdf(t: number, degreesOfFreedom: number): number {
  if (!Number.isFinite(t)) throw new RangeError(`no probability of Student's t at ${t}`);
  if (!(degreesOfFreedom > 0 && Number.isFinite(degreesOfFreedom))) {
    throw new RangeError(`Student's t needs positive degrees of freedom, not ${degreesOfFreedom}`);
  }
  const sum = degreesOfFreedom + t * t;
  if (!Number.isFinite(sum)) return t < 0 ? 0 : 1;
  const tail = betaCdf(degreesOfFreedom / sum, degreesOfFreedom / 2, 0.5, (t * t) / sum) / 2;
  return t < 0 ? tail : 1 - tail;
}

/**
 * The value below which a part p of Student's t distribution lies.
 *
 * Throws `RangeError` unless 0 < p < 1 and the degrees of freedom are finite and positive.
 *
 * @example studentTQuantile(0.975, 10) // 2.2281388520
 */
export function studentTQuantile(p: number, degreesOfFreedom: number): number {
  if (p === 0.5) return 0;
  const tail = (t: number): number => studentTCdf(-t, degreesOfFreedom);
  if (!(p > 0 && p < 1)) throw new RangeError(`a quantile needs a probability between 0 and 1, not ${p}`);
  const lower = Math.min(p, 1 - p);
  let reach = 1;
  while (tail(reach) > lower) reach *= 2;
  const size = rootBetween((t) => tail(t) - lower, 0, reach);
  return p < 0.5 ? -size : size;
}
