/** Below this the recurrence brings x up, above it Stirling's series is good to the last bits of a double. */
const LARGE = 10;

/**
 * The natural logarithm of the gamma function for x > 0, to about fifteen digits: Stirling's formula with its series
 * (Abramowitz and Stegun, 6.1.41) from 10 on, brought there by Γ(x + 1) = x·Γ(x) (6.1.15).
 *
 * Throws `RangeError` unless x is finite and positive, or where the value is more than a double can hold.
 *
 * @example logGamma(5) // ln 24
 */
export function logGamma(x: number): number {
  if (!(x > 0 && Number.isFinite(x))) throw new RangeError(`no log-gamma at ${x}`);
  let product = 1;
  let raised = x;
  while (raised < LARGE) {
    product *= raised;
    raised += 1;
  }
  const stirling = (raised - 0.5) * Math.log(raised) - raised + 0.5 * Math.log(2 * Math.PI);
  const value = stirling + stirlingError(raised) - Math.log(product);
  if (!Number.isFinite(value)) throw new RangeError(`log-gamma at ${x} is not finite`);
  return value;
}

/**
 * What Stirling's formula lacks of ln Γ(x): 1/(12x) − 1/(360x³) + … (Abramowitz and Stegun, 6.1.41). Densities of
 * large parameters are computed with it, where the difference of two log-gammas would lose its digits
 * (A. R. DiDonato and A. H. Morris, ACM Trans. Math. Software 18, 360 (1992)).
 *
 * Throws `RangeError` unless x is at least 10.
 */
export function stirlingError(x: number): number {
  if (!(x >= LARGE)) throw new RangeError(`Stirling's series needs at least ${LARGE}, not ${x}`);
  const square = x * x;
  const [a, b, c, d] = [1 / 1680, 1 / 1188, 691 / 360360, 1 / 156];
  const tail = (1 / 1260 - (a - (b - (c - d / square) / square) / square) / square) / square;
  return (1 / 12 - (1 / 360 - tail) / square) / x;
}
