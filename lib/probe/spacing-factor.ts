/**
 * The correction for pins that are not quite equally spaced: 1 + 1.082·(1 − inner/mean), where `innerSpacingMm`
 * lies between the two inner pins and `meanSpacingMm` is the mean of the three spacings (ASTM F84 / SEMI MF84).
 *
 * Throws RangeError unless both are positive, and where they differ by more than a tenth: the probe is then
 * damaged, not uneven.
 *
 * @example spacingFactor(1.58, 1.588) // 1.00545
 */
export function spacingFactor(innerSpacingMm: number, meanSpacingMm: number): number {
  if (!(innerSpacingMm > 0 && meanSpacingMm > 0)) throw new RangeError('Pin spacings are positive.');
  const ratio = innerSpacingMm / meanSpacingMm;
  if (!(Math.abs(ratio - 1) <= 0.1)) {
    throw new RangeError(
      `An inner spacing of ${innerSpacingMm} mm does not belong to a mean of ${meanSpacingMm} mm.`,
    );
  }
  return 1 + 1.082 * (1 - ratio);
}
