import { logGamma } from './log-gamma';
import { rootBetween } from './root-between';
import { standardNormalCdf } from './standard-normal';

/** How far out, in units of its own width, the density of s is followed: e⁻⁴² is nothing in fifteen digits. */
const NOTHING = 42;

/**
 * The part of a non-central t distribution that lies below t: the probability that (Z + δ)/s stays below t, for Z
 * standard normal and s² an independent chi-square over its degrees of freedom ν. It is the law of a distance to a
 * limit counted in sample standard deviations, and so of a one-sided capability index (D. B. Owen, Technometrics 10,
 * 445 (1968)).
 *
 * P = ∫ Φ(t·s − δ)·f(s) ds over u = ln s by the trapezoid rule, which is exact to about ten digits because the
 * integrand dies away smoothly on both sides; the step follows whichever factor is narrower.
 *
 * Throws `RangeError` unless t and δ are finite and the degrees of freedom are finite and positive.
 */
export function noncentralTCdf(t: number, degreesOfFreedom: number, delta: number): number {
  const freedom = degreesOfFreedom;
  if (!Number.isFinite(t) || !Number.isFinite(delta))
    throw new RangeError('non-central t needs finite numbers');
  if (!(freedom > 0 && Number.isFinite(freedom))) {
    throw new RangeError(`non-central t needs positive degrees of freedom, not ${freedom}`);
  }
  const height = (u: number): number => (freedom / 2) * (2 * u + 1 - Math.exp(2 * u));
  const reach = (side: number): number => rootBetween((u) => height(u) + NOTHING, 0, side);
  const low = reach(-NOTHING * (1 / freedom + 1));
  const high = reach(Math.min(300, 1 + NOTHING / freedom));
  const steps = Math.ceil((high - low) * 2 * Math.sqrt(2 * freedom + (t * Math.exp(high)) ** 2 + 4));
  const step = (high - low) / steps;
  let sum = 0;
  for (let i = 0; i <= steps; i++) {
    const u = low + i * step;
    const z = t * Math.exp(u) - delta;
    if (z > -9) sum += Math.exp(height(u)) * (z > 9 ? 1 : standardNormalCdf(z));
  }
  const scale = Math.log(2) + (freedom / 2) * (Math.log(freedom / 2) - 1) - logGamma(freedom / 2);
  return Math.min(1, sum * step * Math.exp(scale));
}
