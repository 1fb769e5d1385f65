import type { Sensitivities } from './sensitivities';

/** Something that would by itself explain a difference, and how much of it that takes. */
export interface PossibleCause {
  cause: 'dopant' | 'measurement-temperature' | 'thickness' | 'drive-in-temperature';
  unit: '%' | '°C';
  /** What it takes, more being positive. */
  size: number;
  /** Standard uncertainty of that size, from how well the difference is known. */
  uncertainty: number;
  /** What is usual from one time to the next (common practice, no source), by which the causes are ordered. */
  usual: number;
  /** The size over what is usual: the nearer to 1 or below, the less it takes. No probability. */
  timesUsual: number;
  /** Whether the size lies where the slope can be trusted; beyond, the straight line says no more than "a great deal". */
  isOnSlope: boolean;
}

/** How far the slope at the target carries: the coefficient's own 18 to 28 °C, and a fifth of dopant or thickness. */
const REACH: Readonly<Record<PossibleCause['cause'], number>> = {
  dopant: 20,
  'measurement-temperature': 5,
  thickness: 20,
  'drive-in-temperature': 20,
};

/** One standard deviation of what a line sees, common practice, no source; a caller that knows its line gives its own. */
export const USUAL_SIZES: Readonly<Record<PossibleCause['cause'], number>> = {
  dopant: 2,
  'measurement-temperature': 1,
  thickness: 1,
  'drive-in-temperature': 1,
};

/** Below this, in percent per unit, a cause does next to nothing and explains nothing. */
const LEAST_SENSITIVITY = 0.01;

/**
 * What would explain a difference between measured and expected: each single cause with the size it would need,
 * 100·ln(measured/expected)/sensitivity, and that size's uncertainty, the least extraordinary first.
 *
 * It says what would do, not what did: several causes may act at once, and a reading alone tells none from the other.
 * `differenceUncertaintyPercent` is the standard uncertainty of the difference, by `UncertaintyBudget` of the expected
 * value or between wafers. A cause to which the value does not answer is left out. Throws RangeError unless the ratio is
 * positive and the uncertainty not negative.
 *
 * @example possibleCauses(0.98, 0.5, sensitivities(boron 1e15))[0] // dopant, +2.05 %
 */
export function possibleCauses(
  ratio: number,
  differenceUncertaintyPercent: number,
  sensitivity: Sensitivities,
  usual: Readonly<Partial<Record<PossibleCause['cause'], number>>> = {},
): PossibleCause[] {
  if (!(ratio > 0 && Number.isFinite(ratio))) {
    throw new RangeError(`A ratio is a positive number, not ${ratio}.`);
  }
  if (!(differenceUncertaintyPercent >= 0 && Number.isFinite(differenceUncertaintyPercent))) {
    throw new RangeError(`An uncertainty is not negative; it is ${differenceUncertaintyPercent}.`);
  }
  const candidates = [
    ['dopant', '%', sensitivity.perPercentDopant],
    ['measurement-temperature', '°C', sensitivity.perMeasurementC],
    ['thickness', '%', sensitivity.perPercentThickness],
    ['drive-in-temperature', '°C', sensitivity.perDriveInC],
  ] as const;
  return candidates
    .flatMap(([cause, unit, perUnit]): PossibleCause[] => {
      if (perUnit === null || Math.abs(perUnit) < LEAST_SENSITIVITY) return [];
      const size = (100 * Math.log(ratio)) / perUnit;
      const usualSize = usual[cause] ?? USUAL_SIZES[cause];
      if (!(usualSize > 0)) throw new RangeError(`A usual size is positive, not ${usualSize}.`);
      return [
        {
          cause,
          unit,
          size: size === 0 ? 0 : size,
          uncertainty: differenceUncertaintyPercent / Math.abs(perUnit),
          usual: usualSize,
          timesUsual: Math.abs(size) / usualSize,
          isOnSlope: Math.abs(size) <= REACH[cause],
        },
      ];
    })
    .sort((a, b) => a.timesUsual - b.timesUsual);
}
