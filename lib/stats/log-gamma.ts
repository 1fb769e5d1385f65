import { gammaln } from 'simple-statistics';

/**
 * The natural logarithm of the gamma function for x > 0, good to about ten digits: the library's approximation
 * above 10, brought there by Γ(x + 1) = x·Γ(x) (Abramowitz and Stegun, 6.1.15), since it is best for large x.
 *
 * Throws `RangeError` unless x is finite and positive.
 *
 * @example logGamma(5) // ln 24
 */
export function logGamma(x: number): number {
  if (!(x > 0 && Number.isFinite(x))) throw new RangeError(`no log-gamma at ${x}`);
  let product = 1;
  let raised = x;
  while (raised < 10) {
    product *= raised;
    raised += 1;
  }
  const value = gammaln(raised) - Math.log(product);
  if (!Number.isFinite(value)) throw new RangeError(`log-gamma at ${x} is not finite`);
  return value;
}
