/**
 * The mobility, in cm²/(V·s), of electrons or holes against the total impurity density, from 250 to 500 K.
 *
 * Source: Arora, Hauser and Roulston, IEEE Trans. Electron Devices 29, 292 (1982), stated within ±13 %. One set
 * serves every donor. Throws RangeError outside 250…500 K and for a negative density.
 *
 * @example aroraMobility('electron', 1e17, 300) // 777.3
 */
export function aroraMobility(
  carrier: 'electron' | 'hole',
  totalDensityPerCm3: number,
  temperatureK: number,
): number {
  if (!(temperatureK >= 250 && temperatureK <= 500)) {
    throw new RangeError(`The Arora model holds from 250 to 500 K, not at ${temperatureK}.`);
  }
  if (!(totalDensityPerCm3 >= 0 && Number.isFinite(totalDensityPerCm3))) {
    throw new RangeError(`An impurity density is not negative; it is ${totalDensityPerCm3}.`);
  }
  const t = temperatureK / 300;
  const exponent = 0.88 * t ** -0.146;
  if (carrier === 'electron') {
    return (
      88 * t ** -0.57 +
      (7.4e8 * temperatureK ** -2.33) / (1 + (totalDensityPerCm3 / (1.26e17 * t ** 2.4)) ** exponent)
    );
  }
  return (
    54.3 * t ** -0.57 +
    (1.36e8 * temperatureK ** -2.23) / (1 + (totalDensityPerCm3 / (2.35e17 * t ** 2.4)) ** exponent)
  );
}
