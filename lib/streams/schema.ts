import { z } from 'zod';
import { DOPANTS } from '@/lib/physics/dopant';
import { expectedValue } from '@/lib/physics/expected-value';
import { missingForExpected } from '@/lib/physics/missing-for-expected';
import type { Target } from '@/lib/physics/target';
import { typedBox, typedChoice, typedNumber, typedNumberOrNone, typedText, typedTime } from '@/lib/typed';
import type { Specification } from './types';

export const QUANTITIES = ['resistivity', 'sheet_resistance'] as const;
export const PROFILES = ['uniform', 'box', 'gaussian', 'erfc'] as const;
export const KINDS = ['substrate', 'crystal', 'epi', 'implant', 'diffusion'] as const;
export const SUBGROUPS = ['wafer', 'run', 'lot', 'ingot'] as const;
export const STATISTICS = ['areaMean', 'mean', 'median'] as const;
export const CHARTED = ['statistic', 'relative'] as const;
export const SCREENS = ['outliers', 'impossible', 'off'] as const;
export const METRICS = [
  'relativeStandardDeviationPercent',
  'fullRangeOverMidrangePercent',
  'halfRangeOverMidrangePercent',
  'halfRangeOverMeanPercent',
  'radialVariationPercent',
] as const;

const dopants = DOPANTS as readonly [Target['dopant'], ...Target['dopant'][]];
const positive = (value: number) => value > 0;
const isShare = (value: number) => value >= 0 && value <= 100;

/** The name that stands in addresses and files. */
export const slugWords = /^[a-z0-9][a-z0-9-]{0,59}$/;

/** A new stream but for its target and specification. */
export const newStream = z
  .object({
    name: typedText({ most: 120, ask: 'Give the stream a name.' }),
    slug: typedText({ most: 60 }).pipe(
      z
        .string()
        .regex(slugWords, 'Use small letters a to z, digits and hyphens, beginning with a letter or digit.'),
    ),
    kind: typedChoice(KINDS, 'Choose what it makes.'),
    step: typedText({ most: 120, ask: 'Name the step.' }),
    tool: typedText({ most: 120, ask: 'Name the tool.' }),
    chamber: typedText({ most: 120 }),
    recipe: typedText({ most: 120, ask: 'Name the recipe.' }),
    quantity: typedChoice(QUANTITIES, 'Choose what is measured.'),
    sitePlanId: z.string({ error: 'Choose a site plan.' }).regex(/^\d{1,18}$/, 'Choose a site plan.'),
    subgroup: typedChoice(SUBGROUPS, 'Choose what one point of the charts is.'),
    subgroupSize: typedNumber({
      wish: 'a whole number of wafers from 1 to 100',
      holds: (value) => Number.isInteger(value) && value >= 1 && value <= 100,
    }),
    controlStatistic: typedChoice(STATISTICS, 'Choose the control statistic.'),
    chartedValue: typedChoice(CHARTED, 'Choose the charted value.'),
    screening: typedChoice(SCREENS, 'Choose how readings are screened.'),
    repeatabilityPercent: typedNumber({ wish: 'a repeatability from 0 to 100 %', holds: isShare }),
  })
  .refine((stream) => stream.subgroup !== 'wafer' || stream.subgroupSize === 1, {
    path: ['subgroupSize'],
    message: 'A point that is one wafer has one wafer. Count runs, lots or ingots for more.',
  });

const targetFields = z.object({
  dopant: z.enum(dopants, { error: 'Choose the dopant.' }),
  densityPerCm3: typedNumber({ wish: 'a density above 0, such as 1e15', holds: positive }),
  tolerancePercent: typedNumberOrNone({
    wish: 'a tolerance above 0 and below 100 %, or nothing',
    holds: (value) => value > 0 && value < 100,
  }),
  alongCrystal: typedBox,
  profile: typedChoice(PROFILES, 'Choose the profile.'),
  lengthUm: typedNumberOrNone({ wish: 'a length above 0 µm, or nothing', holds: positive }),
  backgroundDopant: z.preprocess((value) => value || null, z.enum(dopants).nullable()),
  backgroundDensityPerCm3: typedNumberOrNone({ wish: 'a density above 0, or nothing', holds: positive }),
  calibrationFactor: typedNumberOrNone({ wish: 'a factor above 0, or nothing', holds: positive }),
  calibrationPercent: typedNumberOrNone({
    wish: 'an uncertainty from 0 to 100 %, or nothing',
    holds: isShare,
  }),
});

/** A target as a form sends it. What physics cannot expect anything of is refused, in physics' own words. */
export function typedTarget(quantity: Target['quantity']) {
  return targetFields.transform((fields, context): Target => {
    const target: Target = { quantity, ...fields };
    const fault = targetFault(target);
    if (fault !== null) context.addIssue({ code: 'custom', path: [fault.field], message: fault.reason });
    return target;
  });
}

function targetFault(target: Target): { field: keyof Target; reason: string } | null {
  if ((target.backgroundDopant === null) !== (target.backgroundDensityPerCm3 === null)) {
    const field = target.backgroundDopant === null ? 'backgroundDopant' : 'backgroundDensityPerCm3';
    return { field, reason: 'A background has a dopant and a density: give both or neither.' };
  }
  if (target.calibrationPercent !== null && target.calibrationFactor === null) {
    return {
      field: 'calibrationFactor',
      reason: 'An uncertainty belongs to a factor: give both or neither.',
    };
  }
  const ingotFraction = target.alongCrystal ? 0 : null;
  if (missingForExpected(target, { ingotFraction }) === 'layerThicknessUm' && target.profile !== 'uniform') {
    return { field: 'lengthUm', reason: `A ${target.profile} layer needs its length.` };
  }
  const isGraded = target.profile === 'gaussian' || target.profile === 'erfc';
  if (isGraded && target.quantity === 'sheet_resistance' && target.backgroundDopant === null) {
    return {
      field: 'backgroundDopant',
      reason: `A ${target.profile} layer ends at a junction: say on what.`,
    };
  }
  try {
    const layerThicknessUm = target.lengthUm ?? 1;
    expectedValue(target, { ingotFraction, layerThicknessUm });
    return null;
  } catch (error) {
    if (error instanceof RangeError) return { field: 'densityPerCm3', reason: error.message };
    throw error;
  }
}

const limit = { wish: 'a number above 0, or nothing', holds: positive };

/** A specification as a form sends it; null when every field is empty. */
export const typedSpecification = z
  .object({
    meanLower: typedNumberOrNone(limit),
    meanUpper: typedNumberOrNone(limit),
    siteLower: typedNumberOrNone(limit),
    siteUpper: typedNumberOrNone(limit),
    nonuniformityMetric: z.preprocess((value) => value || null, z.enum(METRICS).nullable()),
    nonuniformityUpper: typedNumberOrNone(limit),
  })
  .refine(({ meanLower, meanUpper }) => meanLower === null || meanUpper === null || meanLower < meanUpper, {
    path: ['meanUpper'],
    message: 'The upper limit lies above the lower one.',
  })
  .refine(({ siteLower, siteUpper }) => siteLower === null || siteUpper === null || siteLower < siteUpper, {
    path: ['siteUpper'],
    message: 'The upper limit lies above the lower one.',
  })
  .refine((s) => s.nonuniformityMetric !== null || s.nonuniformityUpper === null, {
    path: ['nonuniformityMetric'],
    message: 'Say which measure of evenness the limit is for.',
  })
  .refine((s) => s.nonuniformityMetric === null || s.nonuniformityUpper !== null, {
    path: ['nonuniformityUpper'],
    message: 'Give the limit, or choose no measure.',
  })
  .transform((s): Specification | null => (Object.values(s).every((value) => value === null) ? null : s));

/** What every revision carries beside its numbers. */
export const revisionMeta = (timeZone: string) =>
  z.object({
    effectiveFrom: typedTime(timeZone),
    reason: typedText({ most: 500, ask: 'Say why: it stays with the revision.' }),
  });

/** What a revision of a target carries besides: whether the rules begin afresh where it takes force. */
export const targetMeta = (timeZone: string) => revisionMeta(timeZone).extend({ restart: typedBox });

export const newStreamEvent = (timeZone: string) =>
  z.object({
    kind: typedChoice(['adjustment', 'maintenance'], 'Choose what was done.'),
    at: typedTime(timeZone),
    restart: typedBox,
    text: typedText({ most: 500, ask: 'Say what was done.' }),
  });

/** A change of how readings are screened. */
export const screeningChange = z.object({
  screening: typedChoice(SCREENS, 'Choose how readings are screened.'),
  reason: typedText({ most: 500, ask: 'Say why: it stays with the new limits.' }),
});
