import { mean } from './mean';
import { sampleStandardDeviation } from './sample-standard-deviation';
import { standardNormalLogCdf } from './standard-normal';

/** What the test says, and how far rounding of the values has a hand in it. */
export interface AndersonDarling {
  /** A², and A² corrected for the size of the sample. */
  statistic: number;
  corrected: number;
  /** The probability of so large a value from a normal distribution; 3.7e-24 stands for that and anything smaller. */
  p: number;
  /** Values that have an equal among the others. */
  tied: number;
  /** The smallest step between different values in units of s: 0.5 or more makes normal values fail the test. */
  stepInSigma: number;
}

/**
 * The Anderson–Darling test of whether a sample may come from a normal distribution whose mean and σ are estimated
 * from it (T. W. Anderson and D. A. Darling, J. American Statistical Association 49, 765 (1954)). Control limits and
 * capability lean on the tails, which this test weighs most.
 *
 * A² = −n − Σ (2i − 1)·(ln Φ(zᵢ) + ln(1 − Φ(zₙ₊₁₋ᵢ)))/n, corrected by 1 + 0.75/n + 2.25/n², and p from the four
 * formulas for both parameters estimated (R. B. D'Agostino and M. A. Stephens, Goodness-of-Fit Techniques (1986),
 * table 4.9, from memory). The smallest step and the ties tell of rounding: values rounded to a coarse step are not
 * normal whatever the process is.
 *
 * `null` with fewer than eight values or when all are equal. Throws `RangeError` for an empty sample or a value that
 * is not finite.
 */
export function andersonDarling(sample: ArrayLike<number>): AndersonDarling | null {
  const centre = mean(sample);
  const s = sampleStandardDeviation(sample);
  const n = sample.length;
  if (s === null || s === 0 || n < 8) return null;
  const z = Float64Array.from(sample, (value) => (value - centre) / s).sort();
  let sum = 0;
  for (let i = 0; i < n; i++) {
    sum += (2 * i + 1) * (standardNormalLogCdf(z[i] ?? 0) + standardNormalLogCdf(-(z[n - 1 - i] ?? 0)));
  }
  const statistic = -n - sum / n;
  const corrected = statistic * (1 + 0.75 / n + 2.25 / (n * n));
  return { statistic, corrected, p: probability(corrected), ...rounding(z) };
}

function probability(a: number): number {
  if (a < 0.2) return 1 - Math.exp(-13.436 + 101.14 * a - 223.73 * a * a);
  if (a < 0.34) return 1 - Math.exp(-8.318 + 42.796 * a - 59.938 * a * a);
  if (a < 0.6) return Math.exp(0.9177 - 4.279 * a - 1.38 * a * a);
  const held = Math.min(a, 10);
  return Math.exp(1.2937 - 5.709 * held + 0.0186 * held * held);
}

/** Values less than a millionth of s apart are equal but for the last bits of their arithmetic. */
function rounding(sorted: Float64Array): { tied: number; stepInSigma: number } {
  let tied = 0;
  let stepInSigma = Infinity;
  for (let i = 0; i < sorted.length; i++) {
    const [before, here, after] = [sorted[i - 1] ?? -Infinity, sorted[i] ?? 0, sorted[i + 1] ?? Infinity];
    const gap = Math.min(here - before, after - here);
    if (gap < 1e-6) tied++;
    if (after - here >= 1e-6) stepInSigma = Math.min(stepInSigma, after - here);
  }
  return { tied, stepInSigma };
}
