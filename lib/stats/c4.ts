import { logGamma } from './log-gamma';

/**
 * c4: the expected sample standard deviation of n independent normal values, in units of their σ. Dividing s by
 * it takes out the bias.
 *
 * c4 = √(2/(n − 1)) · Γ(n/2) / Γ((n − 1)/2) (ASTM MNL7; NIST/SEMATECH e-Handbook, section 6.3.2.1).
 *
 * Throws `RangeError` unless n is a whole number of at least 2.
 *
 * @example c4(5) // 0.93998560
 */
export function c4(n: number): number {
  if (!Number.isInteger(n) || n < 2) throw new RangeError(`c4 needs a whole number of at least 2, not ${n}`);
  return Math.sqrt(2 / (n - 1)) * Math.exp(logGamma(n / 2) - logGamma((n - 1) / 2));
}
