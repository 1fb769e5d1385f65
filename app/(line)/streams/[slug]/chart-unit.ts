import { type Stream, unitOf } from '@/lib/streams/types';

/** The unit a stream's level is charted in, and by what stored values are multiplied to be in it. */
export interface ChartUnit {
  unit: string;
  factor: number;
  /** What the level is, under the chart's name. */
  levelLabel: string;
}

export const STATISTIC_WORDS: Record<Stream['controlStatistic'], string> = {
  areaMean: 'area mean',
  mean: 'mean of the sites',
  median: 'median of the sites',
};

/**
 * One unit for a whole chart, in the engineering form that suits a `typical` value of it, so that axis, limits and
 * words agree. A relative chart is in percent: 100·ln(measured/expected).
 *
 * @example chartUnit(sheetStream, 26_600).unit // 'kΩ/□'
 */
export function chartUnit(
  stream: Pick<Stream, 'quantity' | 'chartedValue' | 'controlStatistic'>,
  typical: number | null,
): ChartUnit {
  const statistic = STATISTIC_WORDS[stream.controlStatistic];
  if (stream.chartedValue === 'relative') {
    return { unit: '%', factor: 1, levelLabel: `% off expected: 100·ln(${statistic} / expected)` };
  }
  const size = Math.abs(typical ?? 1);
  const [prefix, factor] = size > 0 && size < 1 ? ['m', 1e3] : size < 1000 ? ['', 1] : ['k', 1e-3];
  const unit = prefix + unitOf(stream.quantity);
  return { unit, factor, levelLabel: `${unit}, ${statistic} at 23 °C` };
}
