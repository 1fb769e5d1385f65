import { runLengthsOf, type ChartDesign } from './chart-run-length';
import type { StartState } from './rule-run-length';

/** How late a chart sees a shift of the mean of `shift` σ: `averageRunLength` points, in the mean. */
export interface Detection {
  shift: number;
  averageRunLength: number;
}

/**
 * What a chart can see: the mean number of points to a signal against the size of a shift, in σ of what is plotted.
 * At a shift of 0 it is the mean number of points between false signals.
 *
 * Throws `RangeError` for a shift that is not finite or a chart that makes no sense.
 *
 * @example detectionCurve({ kind: 'rules', rules: ['beyond-3-sigma'] }, [0, 1]) // 370.4 and 43.9 points
 */
export function detectionCurve(
  design: ChartDesign,
  shifts: readonly number[],
  start: StartState = 'zero',
): Detection[] {
  const runLength = runLengthsOf(design);
  return shifts.map((shift) => ({ shift, averageRunLength: runLength({ shift, start }) }));
}
