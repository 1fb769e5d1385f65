import { hasRoom } from '@/lib/control/has-room';
import { limitSet, type LimitSet } from '@/lib/control/limit-set';
import type { BaselinePoint } from '@/lib/limits/data';

/** A point of a baseline that lies beyond the limits drawn from it, and on which charts. */
export interface BeyondPoint {
  point: BaselinePoint;
  movingRange: number | null;
  charts: string[];
}

/** The limits that a baseline would set, and its own points beyond them; why there are none where there are none. */
export function baselineStudy(
  points: readonly BaselinePoint[],
): { limits: LimitSet; beyond: BeyondPoint[] } | { limits: null; reason: string } {
  if (points.length < 2) {
    const found = points.length === 0 ? 'No judged subgroup lies' : 'One judged subgroup lies';
    return { limits: null, reason: `${found} in this span; limits need two at least, and 25 to be of use.` };
  }
  const limits = limitSet(points);
  if (!hasRoom(limits)) {
    return { limits: null, reason: 'All levels of this span are equal: no limits come of it.' };
  }
  const beyond = points.flatMap((point, i): BeyondPoint[] => {
    const previous = points[i - 1];
    const movingRange = previous === undefined ? null : Math.abs(point.level - previous.level);
    const { within, between } = limits;
    const charts = [
      point.level > limits.level.upper && 'level, above',
      point.level < limits.level.lower && 'level, below',
      movingRange !== null && movingRange > limits.movingRange.upper && 'moving range',
      within !== null && point.within !== null && point.within > within.upper && 'within wafer, above',
      within !== null && point.within !== null && point.within < within.lower && 'within wafer, below',
      between !== null && point.between !== null && point.between > between.upper && 'between wafers',
    ].filter((chart) => chart !== false);
    return charts.length === 0 ? [] : [{ point, movingRange, charts }];
  });
  return { limits, beyond };
}
