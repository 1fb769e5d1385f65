/**
 * The intrinsic carrier density of silicon, per cm³: 5.29e19·(T/300)^2.54·exp(−6726/T).
 *
 * Source: Misiakos and Tsamakis, J. Appl. Phys. 74, 3293 (1993), 78…340 K. Throws RangeError outside.
 *
 * @example intrinsicDensity(300) // 9.696e9
 */
export function intrinsicDensity(temperatureK: number): number {
  if (!(temperatureK >= 78 && temperatureK <= 340)) {
    throw new RangeError(`The intrinsic density is published from 78 to 340 K, not at ${temperatureK}.`);
  }
  return 5.29e19 * (temperatureK / 300) ** 2.54 * Math.exp(-6726 / temperatureK);
}
