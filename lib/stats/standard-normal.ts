const LOG_ROOT_TWO_PI = 0.5 * Math.log(2 * Math.PI);

/** The height of the standard normal curve at z. */
export function standardNormalDensity(z: number): number {
  return Math.exp(-0.5 * z * z - LOG_ROOT_TWO_PI);
}

/**
 * The part of a standard normal distribution that lies below z, to about fifteen digits, and in the far lower
 * tail to the same number of significant ones.
 *
 * Near the middle the series Φ(z) = ½ + φ(z)·(z + z³/3 + z⁵/15 + …) (Abramowitz and Stegun, 26.2.11); in the
 * tails the continued fraction 1 − Φ(z) = φ(z)/(z + 1/(z + 2/(z + 3/…))) (26.2.14).
 *
 * Throws `RangeError` when z is not finite.
 *
 * @example standardNormalCdf(0) // 0.5
 */
export function standardNormalCdf(z: number): number {
  if (!Number.isFinite(z)) throw new RangeError(`no normal probability at ${z}`);
  if (Math.abs(z) < 3) {
    let term = z;
    let sum = z;
    for (let k = 3; Math.abs(term) > 1e-18; k += 2) {
      term *= (z * z) / k;
      sum += term;
    }
    return 0.5 + standardNormalDensity(z) * sum;
  }
  const tail = upperTail(Math.abs(z));
  return z < 0 ? tail : 1 - tail;
}

/**
 * The natural logarithm of `standardNormalCdf`, also where the probability itself is smaller than any double.
 *
 * Throws `RangeError` when z is not finite.
 */
export function standardNormalLogCdf(z: number): number {
  if (z > -3) return Math.log(standardNormalCdf(z));
  if (!Number.isFinite(z)) throw new RangeError(`no normal probability at ${z}`);
  return -0.5 * z * z - LOG_ROOT_TWO_PI - Math.log(tailFraction(-z));
}

function upperTail(z: number): number {
  return standardNormalDensity(z) / tailFraction(z);
}

function tailFraction(z: number): number {
  let fraction = z;
  for (let k = 120; k >= 1; k--) fraction = z + k / fraction;
  return fraction;
}

/**
 * The value below which a part p of a standard normal distribution lies: the inverse of `standardNormalCdf`.
 *
 * Starts from the rational approximation 26.2.23 of Abramowitz and Stegun (good to 4.5e-4) and takes Halley steps
 * on the distribution function itself, always in the lower half, where small probabilities keep their digits.
 *
 * Throws `RangeError` unless 0 < p < 1.
 *
 * @example standardNormalQuantile(0.975) // 1.959963984540054
 */
export function standardNormalQuantile(p: number): number {
  if (!(p > 0 && p < 1)) throw new RangeError(`a quantile needs a probability between 0 and 1, not ${p}`);
  if (p === 0.5) return 0;
  const lower = Math.min(p, 1 - p);
  const t = Math.sqrt(-2 * Math.log(lower));
  const above = 2.515517 + t * (0.802853 + t * 0.010328);
  const below = 1 + t * (1.432788 + t * (0.189269 + t * 0.001308));
  let z = above / below - t;
  for (let step = 0; step < 3; step++) {
    const error = standardNormalCdf(z) - lower;
    const newton = error / standardNormalDensity(z);
    z -= newton / (1 + (z * newton) / 2);
  }
  return p < 0.5 ? z : -z;
}
