/** An EWMA after `count` values, in the unit of the values. */
export interface EwmaState {
  count: number;
  value: number;
}

/** An EWMA before its first value: on the target. */
export function ewmaBegin(target: number): EwmaState {
  return { count: 0, value: target };
}

/**
 * The EWMA after one more value: z = λ·x + (1 − λ)·z (S. W. Roberts, Technometrics 1, 239 (1959); NIST/SEMATECH
 * e-Handbook, section 6.3.2.4).
 *
 * @example nextEwma(ewmaBegin(50), 52, 0.3).value // 50.6
 */
export function nextEwma({ count, value }: EwmaState, x: number, lambda: number): EwmaState {
  return { count: count + 1, value: lambda * x + (1 - lambda) * value };
}

/**
 * Standard deviation of an EWMA of independent values with σ = 1: √(λ/(2 − λ)·[1 − (1 − λ)^2i]) after i values, or what
 * it tends to (`count` null). Same section.
 */
export function ewmaSigma(lambda: number, count: number | null): number {
  const grown = count === null ? 1 : -Math.expm1(2 * count * Math.log1p(-Math.min(lambda, 1)));
  return Math.sqrt((lambda / (2 - lambda)) * grown);
}
