import { completionsAt, type ChartPoint } from './completions-at';
import { limitSet } from './limit-set';

/**
 * How many of the levels, in time order, complete a pattern of the Western Electric rules on a chart whose limits come
 * from their own mean moving range: none, and the process is called stable. Zero with fewer than two levels.
 *
 * Throws `RangeError` for a level that is not finite.
 */
export function signallingPoints(levels: readonly number[]): number {
  if (levels.length < 2) return 0;
  const points = levels.map((level) => ({ level, within: null, between: null, wafers: 1 }));
  const limits = limitSet(points);
  const charted = points.map((point): ChartPoint => ({ ...point, movingRange: null, limits, regime: 'all' }));
  return charted.filter((_, i) => completionsAt(charted, i).length > 0).length;
}
