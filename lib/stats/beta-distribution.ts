import { logGamma, stirlingError } from './log-gamma';
import { rootBetween } from './root-between';

/**
 * The part of a beta distribution with the shapes a and b that lies below x: the regularised incomplete beta function,
 * by its continued fraction (NIST Digital Library of Mathematical Functions, 8.17.22) evaluated by Lentz's method, on
 * whichever side of the mean it converges fast. Student's t and F are taken from it. `rest` is 1 − x, where the caller
 * knows it to more digits.
 *
 * Throws `RangeError` unless 0 ≤ x ≤ 1 and both shapes are finite and positive.
 *
 * @example betaCdf(0.5, 2, 2) // 0.5
 */
export function betaCdf(x: number, a: number, b: number, rest = 1 - x): number {
  if (!(x >= 0 && x <= 1)) throw new RangeError(`no beta probability at ${x}`);
  for (const shape of [a, b]) {
    if (!(shape > 0 && Number.isFinite(shape))) {
      throw new RangeError(`a beta distribution needs positive shapes, not ${shape}`);
    }
  }
  if (x === 0 || rest === 0) return x === 0 ? 0 : 1;
  return x * (b + 1) <= rest * (a + 1)
    ? power(x, rest, a, b) * fraction(x, a, b)
    : 1 - power(rest, x, b, a) * fraction(rest, b, a);
}

/**
 * The value below which a part p of a beta distribution lies.
 *
 * Throws `RangeError` unless 0 < p < 1 and both shapes are finite and positive.
 */
export function betaQuantile(p: number, a: number, b: number): number {
  if (!(p > 0 && p < 1)) throw new RangeError(`a quantile needs a probability between 0 and 1, not ${p}`);
  return rootBetween((x) => betaCdf(x, a, b) - p, 0, 1);
}

/** xᵃ·yᵇ/(a·B(a, b)) with y = 1 − x; for large shapes about the mean, where the factors would cancel. */
function power(x: number, y: number, a: number, b: number): number {
  if (a < 10 || b < 10) {
    return Math.exp(a * Math.log(x) + b * Math.log(y) + logGamma(a + b) - logGamma(a) - logGamma(b)) / a;
  }
  const sum = a + b;
  const off = (b * x - a * y) / sum;
  const height = a * Math.log1p((off * sum) / a) + b * Math.log1p((-off * sum) / b);
  const error = stirlingError(sum) - stirlingError(a) - stirlingError(b);
  return (Math.sqrt((a * b) / (2 * Math.PI * sum)) / a) * Math.exp(height + error);
}

function fraction(x: number, a: number, b: number): number {
  let c = 1;
  let d = 1 / away(1 - ((a + b) * x) / (a + 1));
  let value = d;
  for (let m = 1; m < 100_000; m++) {
    const even = (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m));
    d = 1 / away(1 + even * d);
    c = away(1 + even / c);
    value *= c * d;
    const odd = (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1));
    d = 1 / away(1 + odd * d);
    c = away(1 + odd / c);
    value *= c * d;
    if (Math.abs(c * d - 1) < 1e-16) break;
  }
  return value;
}

/** Lentz's method never divides by zero. */
function away(value: number): number {
  return Math.abs(value) < 1e-300 ? 1e-300 : value;
}
