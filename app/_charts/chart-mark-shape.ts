import type { ChartName } from '@/lib/control/completions-at';
import type { MarkShape } from './mark';
import type { StreamChartPoint } from './stream-chart-point';

/** The patterns of one chart that a point completes, as `chart:rule:side`. */
export function completionsOf(point: Pick<StreamChartPoint, 'completions'>, chart: ChartName): string[] {
  return point.completions.filter((completion) => completion.startsWith(`${chart}:`));
}

/**
 * The mark of a point on one chart. What needs a person outranks how the point came to be: out of specification
 * (level only), then a signal of this chart, then left out, then hollow.
 *
 * @example chartMarkShape({ ...point, completions: ['level:eight-on-one-side:below'] }, 'level') // 'diamond'
 */
export function chartMarkShape(
  point: Pick<StreamChartPoint, 'completions' | 'outOfSpecification' | 'open' | 'judged' | 'hollow'>,
  chart: ChartName,
): MarkShape {
  if (chart === 'level' && point.outOfSpecification) return 'ringed-diamond';
  if (completionsOf(point, chart).length > 0) return 'diamond';
  if (point.open) return 'ring';
  if (!point.judged) return 'cross';
  return point.hollow ? 'ring' : 'dot';
}
