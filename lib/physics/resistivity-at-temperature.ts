import { conductionType, type Dopant } from './dopant';
import { isNear23C, resistivityAt23C } from './temperature-coefficient';
import { temperatureRatio } from './temperature-ratio';

/**
 * The resistivity, in Ω·cm, at another temperature of silicon whose value at 23 °C is known.
 *
 * From 18 to 28 °C and 0.001 to 500 Ω·cm by the coefficient of ASTM F84 / SEMI MF84 turned round, so that
 * `resistivityAt23C` leads back exactly. Elsewhere by the ratio of the Arora model at the two temperatures, with
 * every dopant ionized: from −23 °C (250 K) to 66 °C (339 K). The two do not meet (`temperatureStepPercent`). Throws
 * RangeError outside.
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
  if (isNear23C(temperatureC) && hasCoefficient(resistivityOhmCm)) {
    return byCoefficient(dopant, resistivityOhmCm, temperatureC);
  }
  return resistivityOhmCm * temperatureRatio(dopant, densityPerCm3, temperatureC);
}

/** Within the published coefficient at every temperature from 18 to 28 °C. */
function hasCoefficient(resistivityOhmCm: number): boolean {
  return resistivityOhmCm >= 0.0011 && resistivityOhmCm <= 480;
}

function byCoefficient(dopant: Dopant, resistivityOhmCm: number, temperatureC: number): number {
  let value = resistivityOhmCm;
  for (let step = 0; step < 30; step++) {
    const next = (value * resistivityOhmCm) / resistivityAt23C(conductionType(dopant), value, temperatureC);
    if (next === value) break;
    value = next;
  }
  return value;
}

/**
 * By how many percent the Arora model lies above the measured coefficient at 18 or at 28 °C, where one hands over to the
 * other: a stated step, never blended away. Null where no coefficient is published.
 *
 * @example temperatureStepPercent('boron', 1.34e15, 10, 28) // −0.83
 */
export function temperatureStepPercent(
  dopant: Dopant,
  densityPerCm3: number,
  resistivityOhmCm: number,
  edgeC: 18 | 28,
): number | null {
  if (!hasCoefficient(resistivityOhmCm)) return null;
  const model = resistivityOhmCm * temperatureRatio(dopant, densityPerCm3, edgeC);
  return 100 * (model / byCoefficient(dopant, resistivityOhmCm, edgeC) - 1);
}
