import { dopantPercent } from '@/lib/physics/dopant-percent';
import type { PointExpected } from './point-expected';
import type { BoardStream } from './types';

/** A charted level against what was expected of its wafers, as every page says it. */
export interface LevelAgainstExpected {
  /** 100 · (measured / expected − 1). */
  differencePercent: number;
  /** Standard uncertainty (k = 1) of that, from what is expected; null where nothing is known of it. */
  uncertaintyPercent: number | null;
  /** The same as dopant, with its uncertainty, and the density that it makes; null without a model. */
  dopant: { percent: number; uncertaintyPercent: number; densityPerCm3: number } | null;
}

/** Null without a level, and where the wafers of a subgroup differ in what is expected of them. */
export function levelAgainstExpected(
  level: number | null,
  expected: PointExpected | null,
  chartedValue: BoardStream['chartedValue'],
): LevelAgainstExpected | null {
  if (level === null) return null;
  const value = expected?.value ?? null;
  if (chartedValue !== 'relative' && value === null) return null;
  const ratio = chartedValue === 'relative' ? Math.exp(level / 100) : level / (value as number);
  return {
    differencePercent: 100 * (ratio - 1),
    uncertaintyPercent: expected && ratio * expected.uncertaintyPercent,
    dopant: asDopant(ratio, expected),
  };
}

function asDopant(ratio: number, expected: PointExpected | null): LevelAgainstExpected['dopant'] {
  if (expected === null || expected.model === null) return null;
  const { sensitivity, densityPerCm3 } = expected.model;
  const percent = dopantPercent(ratio, sensitivity);
  if (percent === null) return null;
  return {
    percent,
    uncertaintyPercent: Math.abs(expected.uncertaintyPercent / sensitivity),
    densityPerCm3: densityPerCm3 * (1 + percent / 100),
  };
}

/**
 * What is expected of a subgroup as a band in the unit of its chart, value ± standard uncertainty. On a relative chart
 * expected is nothing, 0. Null where its wafers differ in what is expected of them.
 */
export function expectedBand(
  { value, uncertaintyPercent }: PointExpected,
  chartedValue: BoardStream['chartedValue'],
): { lower: number; value: number; upper: number } | null {
  const share = uncertaintyPercent / 100;
  if (chartedValue === 'relative') {
    return { lower: 100 * Math.log1p(-Math.min(share, 0.99)), value: 0, upper: 100 * Math.log1p(share) };
  }
  return value === null ? null : { lower: value * (1 - share), value, upper: value * (1 + share) };
}
