import { conductionResistivity } from './conduction-resistivity';
import { conductionType, type Dopant } from './dopant';
import { resistivityAt23C } from './temperature-coefficient';

/**
 * The resistivity, in Ω·cm, at another temperature of silicon whose value at 23 °C is known.
 *
 * From 18 to 28 °C and 0.001 to 500 Ω·cm by the coefficient of ASTM F84 / SEMI MF84 turned round, so that
 * `resistivityAt23C` leads back exactly. Elsewhere by the ratio of the Arora model at the two temperatures, with
 * every dopant ionized: from −23 °C (250 K) to 66 °C (339 K). Throws RangeError outside.
 *
 * @example resistivityAtTemperature('boron', 1.34e15, 10, 25) // 10.168
 */
export function resistivityAtTemperature(
  dopant: Dopant,
  densityPerCm3: number,
  resistivityOhmCm: number,
  temperatureC: number,
): number {
  if (temperatureC === 23) return resistivityOhmCm;
  const type = conductionType(dopant);
  if (temperatureC >= 18 && temperatureC <= 28 && resistivityOhmCm >= 0.0011 && resistivityOhmCm <= 480) {
    let value = resistivityOhmCm;
    for (let step = 0; step < 30; step++)
      value *= resistivityOhmCm / resistivityAt23C(type, value, temperatureC);
    return value;
  }
  const doping = {
    donor: dopant === 'boron' ? ('phosphorus' as const) : dopant,
    donorsPerCm3: dopant === 'boron' ? 0 : densityPerCm3,
    acceptorsPerCm3: dopant === 'boron' ? densityPerCm3 : 0,
  };
  const at = (celsius: number): number => conductionResistivity('arora', doping, celsius + 273.15);
  return (resistivityOhmCm * at(temperatureC)) / at(23);
}
