import { z } from 'zod';
import type { LimitSet } from '@/lib/control/limit-set';
import { MEAN_RANGE_OF_TWO, MOVING_RANGE_PROBABILITY } from '@/lib/control/moving-range-factors';
import { typedNumber, typedNumberOrNone, typedText, typedTime } from '@/lib/typed';

const reason = typedText({ most: 500, ask: 'Say why: it stays with the limits.' });

/** The span of a baseline, both ends in it; minutes as time fields send them, the last one whole. */
export const baselineSpan = (timeZone: string) =>
  z
    .object({ from: typedTime(timeZone), to: typedTime(timeZone) })
    .refine(({ from, to }) => from <= to, { path: ['to'], message: 'The span ends after it begins.' })
    .transform(({ from, to }) => ({ from, to: new Date(to.getTime() + 59_999) }));

export const limitDraft = z.object({ reason });

export const limitApproval = (timeZone: string) =>
  z.object({
    revisionId: z.string().regex(/^\d{1,18}$/),
    effectiveFrom: typedTime(timeZone),
    reason: typedText({ most: 500, ask: 'Say why these limits are right: it stays with them.' }),
  });

const spread = { wish: 'a spread above 0, or nothing', holds: (value: number) => value > 0 };
const LEAST_SYMMETRY = 0.01;

/**
 * Limits in use elsewhere before, as a form sends them. The level's σ is a sixth of what lies between its limits; the
 * moving range follows from it where it is not given.
 */
export const inheritedLimits = (timeZone: string, wafers: number) =>
  z
    .object({
      lower: typedNumber({ wish: 'the lower limit' }),
      centre: typedNumber({ wish: 'the centre line' }),
      upper: typedNumber({ wish: 'the upper limit' }),
      subgroups: typedNumberOrNone({
        wish: 'a whole number of subgroups, or nothing',
        holds: (value) => Number.isInteger(value) && value >= 0 && value < 1e6,
      }),
      movingRangeUpper: typedNumberOrNone(spread),
      withinLower: typedNumberOrNone(spread),
      withinCentre: typedNumberOrNone(spread),
      withinUpper: typedNumberOrNone(spread),
      betweenCentre: typedNumberOrNone(spread),
      betweenUpper: typedNumberOrNone(spread),
      effectiveFrom: typedTime(timeZone),
      reason,
    })
    .superRefine((given, context) => {
      const fault = (field: string, message: string) =>
        context.addIssue({ code: 'custom', path: [field], message });
      const { lower, centre, upper } = given;
      if (lower >= upper) fault('upper', 'The upper limit lies above the lower one.');
      else if (centre <= lower || centre >= upper)
        fault('centre', 'The centre line lies between the limits.');
      else if (Math.abs(upper + lower - 2 * centre) > LEAST_SYMMETRY * (upper - lower)) {
        fault(
          'centre',
          `The zones between need equal distances: halfway lies ${Number(((lower + upper) / 2).toPrecision(6))}.`,
        );
      }
      const within = [given.withinLower, given.withinCentre, given.withinUpper];
      const [low, middle, high] = within;
      if (within.some((value) => value === null) !== within.every((value) => value === null)) {
        fault('withinCentre', 'Give all three of the spread within, or none.');
      } else if (low !== null && middle !== null && high !== null && !(low! < middle! && middle! < high!)) {
        fault('withinCentre', 'The centre line lies between the limits.');
      }
      if ((given.betweenCentre === null) !== (given.betweenUpper === null)) {
        fault('betweenUpper', 'Give both of the spread between, or neither.');
      } else if (given.betweenCentre !== null && given.betweenCentre >= given.betweenUpper!) {
        fault('betweenUpper', 'The upper limit lies above the centre line.');
      }
    })
    .transform((given) => {
      const { effectiveFrom, reason: why } = given;
      return { limits: limitsGiven(given, wafers), effectiveFrom, reason: why };
    });

interface Given {
  lower: number;
  centre: number;
  upper: number;
  subgroups: number | null;
  movingRangeUpper: number | null;
  withinLower: number | null;
  withinCentre: number | null;
  withinUpper: number | null;
  betweenCentre: number | null;
  betweenUpper: number | null;
}

function limitsGiven(given: Given, wafers: number): LimitSet {
  const { lower, centre, upper, withinLower, withinCentre, withinUpper, betweenCentre, betweenUpper } = given;
  const sigma = (upper - lower) / 6;
  const meanRange = MEAN_RANGE_OF_TWO * sigma;
  return {
    n: given.subgroups ?? 0,
    level: { centre, sigma, lower, upper },
    movingRange: {
      centre: meanRange,
      upper: given.movingRangeUpper ?? MOVING_RANGE_PROBABILITY * meanRange,
    },
    within:
      withinLower === null || withinCentre === null || withinUpper === null
        ? null
        : {
            logMean: Math.log(withinCentre),
            logSigma: Math.log(withinUpper / withinLower) / 6,
            lower: withinLower,
            centre: withinCentre,
            upper: withinUpper,
          },
    between:
      betweenCentre === null || betweenUpper === null
        ? null
        : { centre: betweenCentre, upper: betweenUpper, wafers },
  };
}
