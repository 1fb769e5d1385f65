import { logGamma } from './log-gamma';
import { standardNormalQuantile } from './standard-normal';

/**
 * The part of a chi-square distribution that lies below x. Serves limits and intervals of standard deviations.
 *
 * The regularised incomplete gamma function P(ν/2, x/2): its series where x is small, its continued fraction
 * where x is large (Abramowitz and Stegun, 6.5.29 and 6.5.31, evaluated by Lentz's method).
 *
 * Throws `RangeError` unless x is finite and the degrees of freedom are finite and positive.
 */
export function chiSquareCdf(x: number, degreesOfFreedom: number): number {
  if (!Number.isFinite(x)) throw new RangeError(`no chi-square probability at ${x}`);
  if (!(degreesOfFreedom > 0 && Number.isFinite(degreesOfFreedom))) {
    throw new RangeError(`chi-square needs positive degrees of freedom, not ${degreesOfFreedom}`);
  }
  if (x <= 0) return 0;
  const a = degreesOfFreedom / 2;
  const y = x / 2;
  const scale = Math.exp(a * Math.log(y) - y - logGamma(a));
  return y < a + 1 ? scale * lowerSeries(a, y) : 1 - scale * upperFraction(a, y);
}

function lowerSeries(a: number, y: number): number {
  let term = 1 / a;
  let sum = term;
  for (let k = 1; k < 100_000 && term > sum * 1e-17; k++) {
    term *= y / (a + k);
    sum += term;
  }
  return sum;
}

function upperFraction(a: number, y: number): number {
  let b = y + 1 - a;
  let c = 1e300;
  let d = 1 / b;
  let fraction = d;
  for (let k = 1; k < 100_000; k++) {
    const numerator = -k * (k - a);
    b += 2;
    d = 1 / (numerator * d + b);
    c = b + numerator / c;
    fraction *= c * d;
    if (Math.abs(c * d - 1) < 1e-16) break;
  }
  return fraction;
}

/**
 * The value below which a part p of a chi-square distribution lies: bisection on `chiSquareCdf` from the bracket
 * around the cube of a normal value (E. B. Wilson and M. M. Hilferty, PNAS 17, 684 (1931)).
 *
 * Throws `RangeError` unless 0 < p < 1 and the degrees of freedom are finite and positive.
 *
 * @example chiSquareQuantile(0.95, 1) // 3.841458821
 */
export function chiSquareQuantile(p: number, degreesOfFreedom: number): number {
  const part = 2 / (9 * degreesOfFreedom);
  const cube = 1 - part + standardNormalQuantile(p) * Math.sqrt(part);
  let upper = Math.max(degreesOfFreedom * cube ** 3, 1e-6) * 2;
  let lower = 0;
  while (chiSquareCdf(upper, degreesOfFreedom) < p) upper *= 2;
  for (let step = 0; step < 200 && upper - lower > 1e-15 * upper; step++) {
    const middle = (lower + upper) / 2;
    if (chiSquareCdf(middle, degreesOfFreedom) < p) lower = middle;
    else upper = middle;
  }
  return (lower + upper) / 2;
}
