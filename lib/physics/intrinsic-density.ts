/** The measurements an intrinsic density may be taken from. */
export type IntrinsicSource = 'misiakos' | 'sproul';

const FITS = {
  misiakos: { lowest: 78, highest: 340, scale: 5.29e19, power: 2.54, kelvin: 6726 },
  sproul: { lowest: 275, highest: 375, scale: 9.15e19, power: 2, kelvin: 6880 },
} as const;

/**
 * The intrinsic carrier density of silicon, per cm³, from one of two published fits: by default
 * 5.29e19·(T/300)^2.54·exp(−6726/T), else 9.15e19·(T/300)²·exp(−6880/T), 3.5 % higher at 300 K.
 *
 * Sources: Misiakos and Tsamakis, J. Appl. Phys. 74, 3293 (1993), 78…340 K; Sproul and Green, J. Appl. Phys. 70, 846
 * (1991), 275…375 K. Temperature in K. Throws RangeError outside.
 *
 * @example intrinsicDensity(300) // 9.696e9
 */
export function intrinsicDensity(temperatureK: number, source: IntrinsicSource = 'misiakos'): number {
  const { lowest, highest, scale, power, kelvin } = FITS[source];
  if (!(temperatureK >= lowest && temperatureK <= highest)) {
    throw new RangeError(
      `The intrinsic density is published from ${lowest} to ${highest} K, not at ${temperatureK}.`,
    );
  }
  return scale * (temperatureK / 300) ** power * Math.exp(-kelvin / temperatureK);
}
