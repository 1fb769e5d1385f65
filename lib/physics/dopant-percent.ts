/**
 * How many percent more dopant make a reading `ratio` times what it was, by the power law value ∝ density^sensitivity:
 * 100·(ratio^(1/sensitivity) − 1). Exact for small differences; over tens of percent it holds as far as the
 * sensitivity itself (`densitySensitivity`) does.
 *
 * `ratio` is measured over expected, `sensitivity` d ln value / d ln density. Null where the answer is too large for a
 * number. Throws RangeError unless the ratio is positive and the sensitivity is neither zero nor infinite.
 *
 * @example dopantPercent(0.98, -1) // 2.04
 */
export function dopantPercent(ratio: number, sensitivity: number): number | null {
  if (!(ratio > 0 && Number.isFinite(ratio)))
    throw new RangeError(`A ratio is a positive number, not ${ratio}.`);
  if (sensitivity === 0 || !Number.isFinite(sensitivity)) {
    throw new RangeError(`A sensitivity is a number other than zero, not ${sensitivity}.`);
  }
  const percent = 100 * Math.expm1(Math.log(ratio) / sensitivity);
  if (percent === 0) return 0;
  return Number.isFinite(percent) ? percent : null;
}
