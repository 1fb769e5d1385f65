import { logGamma, stirlingError } from './log-gamma';
import { positiveQuantile } from './positive-quantile';

/**
 * The part of a chi-square distribution that lies below x. Serves limits and intervals of standard deviations.
 *
 * The regularised incomplete gamma function P(ν/2, x/2): its series where x is small, its continued fraction
 * where x is large (Abramowitz and Stegun, 6.5.29 and 6.5.31, evaluated by Lentz's method).
 *
 * Throws `RangeError` unless x is finite and the degrees of freedom are finite and positive.
 */
export function chiSquareCdf(x: number, degreesOfFreedom: number): number {
  return tails(x, degreesOfFreedom).lower;
}

/** The part of a chi-square distribution that lies above x, to its own digits where it is small. See `chiSquareCdf`. */
export function chiSquareUpperTail(x: number, degreesOfFreedom: number): number {
  return tails(x, degreesOfFreedom).upper;
}

/**
 * The value below which a part p of a chi-square distribution lies, found on its tails.
 *
 * Throws `RangeError` unless 0 < p < 1 and the degrees of freedom are finite and positive.
 *
 * @example chiSquareQuantile(0.95, 1) // 3.841458821
 */
export function chiSquareQuantile(p: number, degreesOfFreedom: number): number {
  return positiveQuantile(
    p,
    degreesOfFreedom,
    (x) => chiSquareCdf(x, degreesOfFreedom),
    (x) => chiSquareUpperTail(x, degreesOfFreedom),
  );
}

function tails(x: number, degreesOfFreedom: number): { lower: number; upper: number } {
  if (!Number.isFinite(x)) throw new RangeError(`no chi-square probability at ${x}`);
  if (!(degreesOfFreedom > 0 && Number.isFinite(degreesOfFreedom))) {
    throw new RangeError(`chi-square needs positive degrees of freedom, not ${degreesOfFreedom}`);
  }
  if (x <= 0) return { lower: 0, upper: 1 };
  const a = degreesOfFreedom / 2;
  const y = x / 2;
  if (y < a + 1) {
    const lower = power(a, y) * lowerSeries(a, y);
    return { lower, upper: 1 - lower };
  }
  const upper = power(a, y) * upperFraction(a, y);
  return { lower: 1 - upper, upper };
}

/** yᵃ·e⁻ʸ/Γ(a); for large a about its peak, where the three factors would cancel. */
function power(a: number, y: number): number {
  if (a < 10) return Math.exp(a * Math.log(y) - y - logGamma(a));
  const off = (y - a) / a;
  return Math.sqrt(a / (2 * Math.PI)) * Math.exp(a * (Math.log1p(off) - off) - stirlingError(a));
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
