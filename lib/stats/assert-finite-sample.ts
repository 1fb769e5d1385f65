/**
 * Refuses a sample that holds anything but finite numbers. Every function of this room that takes a sample calls
 * it first, so that a missing reading read as NaN stops here and never becomes a plausible figure.
 *
 * Throws `RangeError` with the position of the first value that is not finite.
 */
export function assertFiniteSample(sample: ArrayLike<number>): void {
  for (let i = 0; i < sample.length; i++) {
    if (!Number.isFinite(sample[i])) {
      throw new RangeError(`value ${i + 1} of the sample is not a finite number: ${String(sample[i])}`);
    }
  }
}
