import { formatPercent, formatReading, formatSignedPercent } from '@/lib/format';
import { unitOf, type Stream } from '@/lib/streams/types';

/** How values of a stream's charts are written: a reading, or a difference from expected in percent. */
export interface ChartedText {
  unit: string;
  level: (value: number | null) => string;
  /** A distance between levels, such as a moving range. */
  range: (value: number | null) => string;
}

export function chartedText(stream: Pick<Stream, 'chartedValue' | 'quantity'>): ChartedText {
  if (stream.chartedValue === 'relative') {
    return {
      unit: '%',
      level: (value) => formatSignedPercent(value, 2),
      range: (value) => formatPercent(value, 2),
    };
  }
  return {
    unit: unitOf(stream.quantity),
    level: (value) => formatReading(stream.quantity, value, 4),
    range: (value) => formatReading(stream.quantity, value, 3),
  };
}
