import { resistivityAt23C } from '@/lib/physics/temperature-coefficient';

/**
 * A reading taken at the wafer's temperature, brought to 23 °C.
 *
 * Without a thickness `value` is a resistivity in Ω·cm; with one it is the sheet resistance, in Ω/□, of a uniform
 * layer `thicknessUm` thick, whose resistivity decides the coefficient. The answer has the unit of `value`.
 *
 * Source and range as `resistivityAt23C` (ASTM F84 / SEMI MF84): throws RangeError outside 18…28 °C and
 * 0.001…500 Ω·cm.
 *
 * @example readingAt23C('p', 10, 25, null) // 9.835
 */
export function readingAt23C(
  type: 'n' | 'p',
  value: number,
  temperatureC: number,
  thicknessUm: number | null,
): number {
  if (thicknessUm === null) return resistivityAt23C(type, value, temperatureC);
  if (!(thicknessUm > 0 && Number.isFinite(thicknessUm))) {
    throw new RangeError(`A thickness is a positive number of µm, not ${thicknessUm}.`);
  }
  const thicknessCm = thicknessUm * 1e-4;
  return resistivityAt23C(type, value * thicknessCm, temperatureC) / thicknessCm;
}
