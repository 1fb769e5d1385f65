import { expectedOrNull } from './expected-or-null';
import type { ExpectedWafer, Target } from './target';

/**
 * By how much 100·ln(measured/expected) of the same wafers moves when their target is revised: each by 100·ln(expected
 * before / expected after), in percent; the least and the most of it. A tool that is set to the new target moves what
 * is measured by as much the other way.
 *
 * Null where there is no wafer of which both targets expect something.
 *
 * @example chartedShift(boron, { ...boron, calibrationFactor: 1.02 }, [{}]) // { least: −1.980, most: −1.980 }
 */
export function chartedShift(
  before: Target,
  after: Target,
  wafers: readonly ExpectedWafer[],
): { least: number; most: number } | null {
  const shifts = wafers.flatMap((wafer) => {
    const [was, is] = [expectedOrNull(before, wafer), expectedOrNull(after, wafer)];
    return was && is ? [100 * Math.log(was.value / is.value)] : [];
  });
  return shifts.length === 0 ? null : { least: Math.min(...shifts), most: Math.max(...shifts) };
}
