import { expectedValue, type Expected } from './expected-value';
import { missingForExpected } from './missing-for-expected';
import type { ExpectedWafer, Target } from './target';

/** What physics expects of a wafer; null where something it needs is missing, or the conversion ends before it. */
export function expectedOrNull(target: Target, wafer: ExpectedWafer): Expected | null {
  if (missingForExpected(target, wafer) !== null) return null;
  try {
    return expectedValue(target, wafer);
  } catch (error) {
    if (error instanceof RangeError) return null;
    throw error;
  }
}
