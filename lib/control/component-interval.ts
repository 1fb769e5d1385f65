import { chiSquareQuantile } from '@/lib/stats/chi-square';
import { fQuantile } from '@/lib/stats/f-distribution';
import type { Interval } from './limit-interval';
import type { MeanSquare } from './nested-anova';

/**
 * The interval of a variance component (above − below)/multiple from two independent mean squares: the modified
 * large-sample limits of N. Ting, R. K. Burdick, F. A. Graybill, S. Jeyaratnam and T.-F. C. Lu, J. Statistical
 * Computation and Simulation 35, 135 (1990), exact where either mean square stands alone (R. K. Burdick and
 * F. A. Graybill, Confidence Intervals on Variance Components (1992), section 3.3; both from memory, coverage checked
 * by simulation). Without `below` it is the chi-square interval of one mean square. Never below zero.
 *
 * Throws `RangeError` unless 0 < confidence < 1 and degrees of freedom are positive.
 */
export function componentInterval(
  above: MeanSquare,
  below: MeanSquare | null,
  multiple: number,
  confidence = 0.95,
): Interval {
  const tail = (1 - confidence) / 2;
  const n = above.degreesOfFreedom;
  /** χ²/ν of the upper and lower tail of a mean square. */
  const high = (freedom: number): number => chiSquareQuantile(1 - tail, freedom) / freedom;
  const low = (freedom: number): number => chiSquareQuantile(tail, freedom) / freedom;
  if (below === null || below.value === 0) {
    return { low: above.value / high(n) / multiple, high: above.value / low(n) / multiple };
  }
  const m = below.degreesOfFreedom;
  const difference = above.value - below.value;
  const reach = (own: number, other: number, f: number): number => {
    const cross = ((f - 1) ** 2 - (own * f) ** 2 - other ** 2) / f;
    const square = (own * above.value) ** 2 + (other * below.value) ** 2 + cross * above.value * below.value;
    return Math.sqrt(Math.max(0, square));
  };
  const down = reach(1 - 1 / high(n), 1 / low(m) - 1, fQuantile(1 - tail, n, m));
  const up = reach(1 / low(n) - 1, 1 - 1 / high(m), fQuantile(tail, n, m));
  return { low: Math.max(0, difference - down) / multiple, high: Math.max(0, difference + up) / multiple };
}
