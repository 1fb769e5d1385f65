/**
 * The place between `low` and `high` where f changes sign: inverse quadratic steps where they are safe, halving where
 * they are not (T. R. Chandrupatla, Advances in Engineering Software 28, 145 (1997)). To the last bits of a double.
 *
 * Throws `RangeError` when f has the same sign at both ends or is not finite there.
 *
 * @example rootBetween((x) => x * x - 2, 0, 2) // √2
 */
export function rootBetween(f: (x: number) => number, low: number, high: number): number {
  let [near, far, third] = [high, low, low];
  let [fNear, fFar] = [f(near), f(far)];
  let fThird = fFar;
  if (!(Number.isFinite(fNear) && Number.isFinite(fFar) && fNear * fFar <= 0)) {
    throw new RangeError(`no change of sign between ${low} and ${high}`);
  }
  let part = 0.5;
  for (let step = 0; step < 300; step++) {
    const x = near + part * (far - near);
    const value = f(x);
    if (Math.sign(value) === Math.sign(fNear)) [third, fThird] = [near, fNear];
    else [third, fThird, far, fFar] = [far, fFar, near, fNear];
    [near, fNear] = [x, value];
    const best = Math.abs(fNear) < Math.abs(fFar) ? near : far;
    const least = (2 * Number.EPSILON * Math.abs(best) + Number.MIN_VALUE) / Math.abs(far - near);
    if (fNear === 0 || least > 0.5) return fNear === 0 ? near : best;
    const xi = (near - far) / (third - far);
    const phi = (fNear - fFar) / (fThird - fFar);
    const safe = phi * phi < xi && (1 - phi) ** 2 < 1 - xi;
    part = safe
      ? (fNear / (fFar - fNear)) * (fThird / (fFar - fThird)) +
        ((third - near) / (far - near)) * (fNear / (fThird - fNear)) * (fFar / (fThird - fFar))
      : 0.5;
    part = Math.min(1 - least, Math.max(least, part));
  }
  return near;
}
