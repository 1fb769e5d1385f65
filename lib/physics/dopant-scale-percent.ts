/**
 * The one scale on which all recipes and products of a tool share a chart: 100·ln(measured/expected)/sensitivity, in
 * percent of dopant or dose, so that a rare product is judged from its first wafer.
 *
 * Additive, as charts want it: a step of the tool's dose by 1 % is a step of 1 on every product, whatever its doping;
 * for small steps it is `dopantPercent`. `ratio` is measured over expected, `sensitivity` d ln value/d ln density.
 * Throws RangeError unless the ratio is positive and the sensitivity is neither zero, nor next to it, nor infinite.
 *
 * @example dopantScalePercent(0.98, -0.5) // 4.04
 */
export function dopantScalePercent(ratio: number, sensitivity: number): number {
  if (!(ratio > 0 && Number.isFinite(ratio))) {
    throw new RangeError(`A ratio is a positive number, not ${ratio}.`);
  }
  if (sensitivity === 0 || !Number.isFinite(sensitivity)) {
    throw new RangeError(`A sensitivity is a number other than zero, not ${sensitivity}.`);
  }
  const percent = (100 * Math.log(ratio)) / sensitivity;
  if (!Number.isFinite(percent))
    throw new RangeError(`A sensitivity of ${sensitivity} tells nothing of the dopant.`);
  return percent === 0 ? 0 : percent;
}
