import { polynomial } from './polynomial';

const N_TYPE = [
  7.364e-1, 6.56e-2, -3.075e-2, -2.427e-3, 7.5883e-3, 7.5541e-4, -1.3976e-3, -1.159e-6, 1.106882e-4,
  -4.56719e-6, -4.407686e-6, 2.601512e-7, 9.40856e-8, -6.1907e-9, -1.032377e-9, 6.890181e-11, 4.58514e-12,
  -2.94332e-13,
];

const P_TYPE = [
  7.068e-1, 8.544e-2, -1.478e-2, 1.635e-3, -2.003e-3, 3.415e-4, 2.0915e-4, -4.3237e-5, -7.0532e-6, 1.60868e-6,
  1.0346e-7, -2.5201e-8, -5.6419e-10, 1.4445e-10,
];

/**
 * How much the resistivity of silicon rises per °C near 23 °C, in percent per °C.
 *
 * A wafer two degrees warm reads 1.5 % high above 1 Ω·cm, which is more than most lines drift in a month.
 *
 * Source: ASTM F84 / SEMI MF84, after Bullis, Brewer, Kolstad and Swartzendruber, Solid-State Electronics 11,
 * 639 (1968): a polynomial in ln ρ, from 0.001 to 500 Ω·cm. Negative for n-type near 0.01 Ω·cm.
 *
 * `resistivityOhmCm` in Ω·cm. Throws RangeError outside 0.001…500.
 *
 * @example temperatureCoefficientPercentPerC('p', 10) // 0.8248
 */
export function temperatureCoefficientPercentPerC(type: 'n' | 'p', resistivityOhmCm: number): number {
  if (!hasTemperatureCoefficient(resistivityOhmCm)) {
    throw new RangeError(
      `The temperature coefficient is published from 0.001 to 500 Ω·cm, not at ${resistivityOhmCm}.`,
    );
  }
  return polynomial(type === 'n' ? N_TYPE : P_TYPE, Math.log(resistivityOhmCm));
}

/** Whether the coefficient is published at a resistivity: 0.001 to 500 Ω·cm. */
export function hasTemperatureCoefficient(resistivityOhmCm: number): boolean {
  return resistivityOhmCm >= 0.001 && resistivityOhmCm <= 500;
}

/** Whether the published coefficients serve at a wafer temperature: 18 to 28 °C. */
export function isNear23C(temperatureC: number): boolean {
  return temperatureC >= 18 && temperatureC <= 28;
}

/**
 * A resistivity measured at a wafer temperature near 23 °C, brought to 23 °C: ρ·(1 − C/100·(T − 23)).
 *
 * `resistivityOhmCm` as measured, in Ω·cm; `temperatureC` of the wafer in °C; the answer in Ω·cm. Source: as
 * `temperatureCoefficientPercentPerC`. Throws RangeError outside 18…28 °C or 0.001…500 Ω·cm.
 *
 * @example resistivityAt23C('p', 10, 25) // 9.835
 */
export function resistivityAt23C(type: 'n' | 'p', resistivityOhmCm: number, temperatureC: number): number {
  if (!isNear23C(temperatureC)) {
    throw new RangeError(`The temperature correction holds from 18 to 28 °C, not at ${temperatureC}.`);
  }
  const coefficient = temperatureCoefficientPercentPerC(type, resistivityOhmCm);
  return resistivityOhmCm * (1 - (coefficient / 100) * (temperatureC - 23));
}
