import { z } from 'zod';
import { DOPANTS } from '@/lib/physics/dopant';
import type { Target } from '@/lib/physics/target';
import { typedBox, typedChoice, typedNumberOrNone } from '@/lib/typed';
import { typedPairs } from './typed-pairs';

export const PROFILES = ['uniform', 'box', 'gaussian', 'erfc', 'implant', 'pairs'] as const;
export const METHODS = ['four-point', 'other'] as const;
/** What a person may know of a dopant, and of a length: the target keeps density and length. */
export const GIVEN = ['density', 'resistivity', 'dose'] as const;
export const LENGTHS = ['length', 'junction'] as const;

const dopants = DOPANTS as readonly [Target['dopant'], ...Target['dopant'][]];
const positive = (value: number) => value > 0;
const isShare = (value: number) => value >= 0 && value <= 100;
const dopantOrNone = z.preprocess((value) => value || null, z.enum(dopants).nullable());
const densityOrNone = typedNumberOrNone({ wish: 'a density above 0, such as 1e15', holds: positive });
const umOrNone = typedNumberOrNone({ wish: 'a length above 0 µm, or nothing', holds: positive });

/** The fields of a target's form, each by itself; what they make together is `targetOfFields`. */
export const targetFields = z.object({
  dopant: z.enum(dopants, { error: 'Choose the dopant.' }),
  given: z.preprocess((value) => value || 'density', typedChoice(GIVEN, 'Choose what is known.')),
  densityPerCm3: densityOrNone,
  resistivityOhmCm: typedNumberOrNone({ wish: 'a resistivity above 0 Ω·cm', holds: positive }),
  dosePerCm2: typedNumberOrNone({ wish: 'a dose above 0, such as 3e14', holds: positive }),
  tolerancePercent: typedNumberOrNone({
    wish: 'a tolerance above 0 and below 100 %, or nothing',
    holds: (value) => value > 0 && value < 100,
  }),
  alongCrystal: typedBox,
  profile: typedChoice(PROFILES, 'Choose the profile.'),
  lengthGiven: z.preprocess((value) => value || 'length', typedChoice(LENGTHS, 'Choose what is known.')),
  lengthUm: umOrNone,
  junctionUm: umOrNone,
  rangeUm: typedNumberOrNone({ wish: 'a range from 0 µm on, or nothing', holds: (value) => value >= 0 }),
  driveInC: typedNumberOrNone({ wish: 'a temperature in °C, or nothing' }),
  driveInMin: typedNumberOrNone({ wish: 'a time above 0 min, or nothing', holds: positive }),
  pairs: typedPairs,
  backgroundDopant: dopantOrNone,
  backgroundDensityPerCm3: typedNumberOrNone({ wish: 'a density above 0, or nothing', holds: positive }),
  counterDopant: dopantOrNone,
  counterDensityPerCm3: typedNumberOrNone({ wish: 'a density above 0, or nothing', holds: positive }),
  method: z.preprocess((value) => value || null, z.enum(METHODS).nullable()),
  temperatureCoefficientPercentPerC: typedNumberOrNone({
    wish: 'a coefficient from −2 to 2 % per °C, or nothing',
    holds: (value) => Math.abs(value) <= 2,
  }),
  calibrationFactor: typedNumberOrNone({ wish: 'a factor above 0, or nothing', holds: positive }),
  calibrationPercent: typedNumberOrNone({
    wish: 'an uncertainty from 0 to 100 %, or nothing',
    holds: isShare,
  }),
});

export type TargetFields = z.infer<typeof targetFields>;
