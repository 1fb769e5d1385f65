import { completionsAt, type ChartPoint } from './completions-at';
import { limitSet } from './limit-set';
import { baselineOf, estimatorOf, studySignal, type StudyChart, type StudyOptions } from './study-chart';

/**
 * A study of single values in time order: the level chart with limits from the mean (or median) moving range, and
 * the chart of the moving ranges (NIST/SEMATECH e-Handbook, section 6.3.2.2). The first point has no moving range.
 *
 * Throws `RangeError` with fewer than two values, a value that is not finite, or a baseline that does not fit.
 */
export function individualsCharts(values: readonly number[], options: StudyOptions): StudyChart[] {
  const points = values.map((level) => ({ level, within: null, between: null, wafers: 1 }));
  const estimator = estimatorOf(options.estimator, ['mean-moving-range', 'median-moving-range']);
  const limits = limitSet(baselineOf(points, options.baseline), { movingRange: options.limits, estimator });
  const charted = points.map((point, i): ChartPoint => {
    const before = values[i - 1];
    const movingRange = before === undefined ? null : Math.abs(point.level - before);
    return { ...point, movingRange, limits, regime: 'study' };
  });
  const completions = charted.flatMap((_, i) => completionsAt(charted, i, options.rules));
  const signals = (chart: string) => completions.filter((c) => c.chart === chart).map(studySignal);
  return [
    { name: 'level', estimator, ...limits.level, points: [...values], signals: signals('level') },
    {
      name: 'moving-range',
      estimator,
      centre: limits.movingRange.centre,
      upper: limits.movingRange.upper,
      lower: 0,
      sigma: Math.sqrt(2 - 4 / Math.PI) * limits.level.sigma,
      points: charted.map((point) => point.movingRange),
      signals: signals('moving-range'),
    },
  ];
}
