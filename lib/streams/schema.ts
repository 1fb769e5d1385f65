import { z } from 'zod';
import { typedBox, typedChoice, typedNumber, typedNumberOrNone, typedText, typedTime } from '@/lib/typed';
import type { Specification } from './types';

export const QUANTITIES = ['resistivity', 'sheet_resistance'] as const;
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

/** Nothing takes an event back, so a year that was mistyped must not get in: what is recorded has been done. */
const MINUTE_MS = 60_000;

export const newStreamEvent = (timeZone: string) =>
  z.object({
    kind: typedChoice(['adjustment', 'maintenance'], 'Choose what was done.'),
    at: typedTime(timeZone).refine((at) => at.getTime() <= Date.now() + MINUTE_MS, {
      error: 'This time lies ahead: record what was done once it is done.',
    }),
    restart: typedBox,
    text: typedText({ most: 500, ask: 'Say what was done.' }),
  });

/** A change of how readings are screened. */
export const screeningChange = z.object({
  screening: typedChoice(SCREENS, 'Choose how readings are screened.'),
  reason: typedText({ most: 500, ask: 'Say why: it stays with the new limits.' }),
});
