import { complementaryErrorFunction } from './complementary-error-function';

/** The share of a normal distribution below `u` standard deviations, to a relative 1e-13 in both tails. */
export function normalShare(u: number): number {
  const tail = complementaryErrorFunction(Math.min(Math.abs(u), 50) / Math.SQRT2) / 2;
  return u < 0 ? tail : 1 - tail;
}
