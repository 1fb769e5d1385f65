import type { ChartName } from '@/lib/control/completions-at';
import type { StreamChartPoint } from './stream-chart-point';

/** The figure of a point that one chart draws; null where it is undefined. */
export function chartValue(
  point: Pick<StreamChartPoint, 'level' | 'movingRange' | 'within' | 'between'>,
  chart: ChartName,
): number | null {
  if (chart === 'level') return point.level;
  if (chart === 'moving-range') return point.movingRange;
  return chart === 'within' ? point.within : point.between;
}
