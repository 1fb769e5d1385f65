import { mean } from '@/lib/stats/mean';
import { completionsAt, type ChartPoint } from './completions-at';
import { spreadChart } from './spread-chart';
import { pooledSigma } from './pooled-sigma';
import { sigmaWithin, type SpreadLaw } from './spread-law';
import {
  baselineOf,
  estimatorOf,
  oneOrMany,
  studySignal,
  type StudyChart,
  type StudyOptions,
} from './study-chart';

/**
 * A study of subgroups whose values differ by chance alone: the chart of their means, with limits from the spread
 * within them, and the chart of that spread (`rangeLaw`: mean and range; `standardDeviationLaw`: mean and s, σ from the mean s
 * or the pooled s). The
 * constants are those of ASTM MNL7, computed for each subgroup's own size; the centre line is the mean of all
 * values of the baseline.
 *
 * Not for sites of a wafer, whose spread is systematic: there the limits come out far too tight.
 *
 * Throws `RangeError` with fewer than two subgroups, an empty one, a value that is not finite, no subgroup of two
 * values, or a baseline that does not fit.
 */
export function meanSpreadCharts(
  subgroups: readonly (readonly number[])[],
  law: SpreadLaw,
  options: StudyOptions,
): StudyChart[] {
  const baseline = baselineOf(subgroups, options.baseline);
  const estimator =
    law.name === 'range'
      ? estimatorOf(options.estimator, ['mean-range'])
      : estimatorOf(options.estimator, ['mean-s', 'pooled-s']);
  const sigma = estimator === 'pooled-s' ? pooledSigma(baseline) : sigmaWithin(baseline, law);
  const centre = mean(baseline.flat());
  const points = subgroups.map((values): ChartPoint => {
    const error = sigma / Math.sqrt(values.length);
    const level = { centre, sigma: error, lower: centre - 3 * error, upper: centre + 3 * error };
    const limits = {
      n: baseline.length,
      level,
      movingRange: { centre: 0, upper: 0 },
      within: null,
      between: null,
    };
    return {
      level: mean(values),
      within: null,
      between: null,
      wafers: 1,
      movingRange: null,
      limits,
      regime: 'study',
    };
  });
  const figure = (name: 'upper' | 'lower' | 'sigma') =>
    oneOrMany(points.map((point) => point.limits?.level[name] ?? null));
  return [
    {
      name: 'level',
      estimator,
      centre,
      upper: figure('upper'),
      lower: figure('lower'),
      sigma: figure('sigma'),
      points: points.map((point) => point.level),
      signals: points.flatMap((_, i) => completionsAt(points, i, options.rules)).map(studySignal),
    },
    spreadChart(law.name, subgroups, law, { sigma, estimator }, options),
  ];
}
