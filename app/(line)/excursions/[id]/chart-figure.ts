import type { ChartName } from '@/lib/control/completions-at';
import type { CaseStream } from '@/lib/excursions/types';
import { formatPercent, formatReading, formatSignedPercent } from '@/lib/format';

/** A figure of one chart with its unit; a relative level is a difference and carries its sign. */
export function chartFigure(stream: CaseStream, chart: ChartName, value: number | null): string {
  if (chart === 'within') return formatPercent(value);
  if (stream.chartedValue === 'statistic')
    return formatReading(stream.quantity, value, chart === 'level' ? 4 : 2);
  return chart === 'level' ? formatSignedPercent(value, 2) : formatPercent(value);
}

/** What the vertical axis of a chart is. */
export function chartAxis(stream: CaseStream, chart: ChartName): string {
  const unit = stream.quantity === 'resistivity' ? 'Ω·cm' : 'Ω/□';
  const isRelative = stream.chartedValue === 'relative';
  switch (chart) {
    case 'level':
      return isRelative ? 'Level against expected, in percent' : `Level, ${unit} at 23 °C`;
    case 'moving-range':
      return `Moving range, ${isRelative ? 'in percent' : unit}`;
    case 'within':
      return 'Spread within the wafer, 1 s in percent of the mean';
    case 'between':
      return `Spread between the wafers of a subgroup, ${isRelative ? 'in percent' : unit}`;
  }
}
