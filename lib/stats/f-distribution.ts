import { betaCdf } from './beta-distribution';
import { positiveQuantile } from './positive-quantile';

/**
 * The part of an F distribution that lies below x: an incomplete beta function (Abramowitz and Stegun, 26.6.2). Judges
 * the ratio of two mean squares.
 *
 * Throws `RangeError` unless x is finite and both degrees of freedom are finite and positive.
 */
export function fCdf(x: number, above: number, below: number): number {
  return tails(x, above, below).lower;
}

/**
 * The part of an F distribution that lies above x, to its own digits where it is small. See `fCdf`.
 *
 * @example fUpperTail(1, 5, 5) // 0.5
 */
export function fUpperTail(x: number, above: number, below: number): number {
  return tails(x, above, below).upper;
}

/**
 * The value below which a part p of an F distribution lies.
 *
 * Throws `RangeError` unless 0 < p < 1 and both degrees of freedom are finite and positive.
 *
 * @example fQuantile(0.95, 5, 125) // 2.286825
 */
export function fQuantile(p: number, above: number, below: number): number {
  return positiveQuantile(
    p,
    1,
    (x) => fCdf(x, above, below),
    (x) => fUpperTail(x, above, below),
  );
}

function tails(x: number, above: number, below: number): { lower: number; upper: number } {
  if (!Number.isFinite(x)) throw new RangeError(`no F probability at ${x}`);
  for (const freedom of [above, below]) {
    if (!(freedom > 0 && Number.isFinite(freedom))) {
      throw new RangeError(`F needs positive degrees of freedom, not ${freedom}`);
    }
  }
  if (x <= 0) return { lower: 0, upper: 1 };
  const share = 1 / (1 + below / (above * x));
  const rest = 1 / (1 + (above * x) / below);
  return {
    lower: betaCdf(share, above / 2, below / 2, rest),
    upper: betaCdf(rest, below / 2, above / 2, share),
  };
}
