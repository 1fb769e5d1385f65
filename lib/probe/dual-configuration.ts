/**
 * The sheet resistance, in Ω/□, that two four-pin resistances agree on: R_A (current 1–4, voltage 2–3) and R_B
 * (current 1–3, voltage 2–4), from exp(2πR_A/Rs) − exp(2πR_B/Rs) = 1.
 *
 * Pin spacing drops out. Exact on a sheet without end, and on a disc with the pins along a diameter; approximate
 * across the radius near an edge. R. Rymaszewski, J. Phys. E 2, 170 (1969).
 *
 * Both in Ω. Throws RangeError unless R_A > R_B > 0.
 *
 * @example dualConfiguration(22.0636, 17.485) // 100.0
 */
export function dualConfiguration(resistanceAOhm: number, resistanceBOhm: number): number {
  const [a, b] = [resistanceAOhm, resistanceBOhm];
  if (!(b > 0 && a > b && Number.isFinite(a))) {
    throw new RangeError(`The two configurations must give R_A > R_B > 0, not ${a} and ${b} Ω.`);
  }
  // x = 2π/Rs solves a·x + ln(1 − exp(−(a − b)·x)) = 0, which rises in x without overflow: halve the bracket.
  let [low, high] = [0, Math.LN2 / (a - b) + Math.LN2 / a];
  for (let step = 0; step < 200 && high - low > 1e-15 * high; step++) {
    const x = (low + high) / 2;
    if (a * x + Math.log(-Math.expm1(-(a - b) * x)) > 0) high = x;
    else low = x;
  }
  return (2 * Math.PI) / ((low + high) / 2);
}
