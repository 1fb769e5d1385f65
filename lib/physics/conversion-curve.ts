import type { Dopant } from './dopant';
import { resistivityAtTemperature } from './resistivity-at-temperature';
import { FITS_AT_23C } from './standard-fits';
import { standardRanges } from './standard-range';

/** One point of a curve of resistivity against doping. */
export interface CurvePoint {
  densityPerCm3: number;
  resistivityOhmCm: number;
}

/**
 * Resistivity against doping over the whole standard conversion of a dopant, at a temperature, as pieces to be drawn on
 * logarithmic axes: one piece for each published fit, so that the step of arsenic stays a step.
 *
 * `perDecade` points in each decade, both ends of a fit among them. Throws RangeError unless that is 1 or more, and
 * outside −23…66 °C.
 *
 * @example conversionCurve('arsenic', 23, 10).length // 2
 */
export function conversionCurve(dopant: Dopant, temperatureC: number, perDecade: number): CurvePoint[][] {
  if (!(perDecade >= 1 && perDecade <= 1000)) {
    throw new RangeError(`A curve has 1 to 1000 points in each decade, not ${perDecade}.`);
  }
  return [...standardRanges(dopant)].reverse().map(({ fit, lowerPerCm3, upperPerCm3 }) => {
    const steps = Math.ceil(Math.log10(upperPerCm3 / lowerPerCm3) * perDecade);
    return Array.from({ length: steps + 1 }, (_, i): CurvePoint => {
      const inside = lowerPerCm3 * (upperPerCm3 / lowerPerCm3) ** (i / steps);
      const densityPerCm3 = i === 0 ? lowerPerCm3 : i === steps ? upperPerCm3 : inside;
      const at23C = FITS_AT_23C[fit].resistivity(densityPerCm3);
      return {
        densityPerCm3,
        resistivityOhmCm: resistivityAtTemperature(dopant, densityPerCm3, at23C, temperatureC),
      };
    });
  });
}
