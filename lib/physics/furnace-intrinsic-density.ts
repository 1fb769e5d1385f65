const BOLTZMANN_EV = 8.617333262e-5;

/**
 * The intrinsic carrier density of silicon, per cm³, at a furnace temperature in °C: 3.87e16·T^1.5·exp(−0.605 eV/kT).
 *
 * Dopants lighter than it diffuse at their textbook rate; heavier ones make their own, faster. Source: Morin and Maita,
 * Phys. Rev. 96, 28 (1954) (from memory), carried on to 1250 °C as process models do. Throws RangeError outside
 * 600…1250 °C.
 *
 * @example furnaceIntrinsicDensity(1100) // 1.2e19
 */
export function furnaceIntrinsicDensity(temperatureC: number): number {
  if (!(temperatureC >= 600 && temperatureC <= 1250)) {
    throw new RangeError(`A furnace works from 600 to 1250 °C here, not at ${temperatureC}.`);
  }
  const temperatureK = temperatureC + 273.15;
  return 3.87e16 * temperatureK ** 1.5 * Math.exp(-0.605 / (BOLTZMANN_EV * temperatureK));
}
