/** The ratios R_A/R_B over which the form is stated to hold. */
const [LEAST, MOST] = [1.2, 1.345];

/**
 * The sheet resistance, in Ω/□, of two four-pin resistances by the quadratic form in general use:
 * Rs = R_A·(−14.696 + 25.173·r − 7.872·r²), r = R_A/R_B. R_A with the current through pins 1 and 4, R_B through 1 and 3.
 *
 * Within 0.06 % of the exact form (`dualConfiguration`) for 1.20 ≤ r ≤ 1.345 and nowhere else: RangeError outside, where
 * a pin is damaged or the edge near. It serves to check what another instrument says; the exact form costs no more.
 *
 * Both in Ω. Throws RangeError unless both are positive.
 *
 * @example dualConfigurationQuadratic(22.0636, 17.485) // 100.0
 */
export function dualConfigurationQuadratic(resistanceAOhm: number, resistanceBOhm: number): number {
  if (!(resistanceAOhm > 0 && resistanceBOhm > 0 && Number.isFinite(resistanceAOhm))) {
    throw new RangeError(`Resistances are positive, not ${resistanceAOhm} and ${resistanceBOhm} Ω.`);
  }
  const ratio = resistanceAOhm / resistanceBOhm;
  if (!(ratio >= LEAST && ratio <= MOST)) {
    throw new RangeError(
      `The quadratic form holds for R_A/R_B from ${LEAST.toFixed(2)} to ${MOST}, not at ${ratio.toPrecision(4)}.`,
    );
  }
  return resistanceAOhm * (-14.696 + 25.173 * ratio - 7.872 * ratio ** 2);
}
