import { mean } from '@/lib/stats/mean';
import { individualsCharts } from './individuals-charts';
import { spreadChart } from './spread-chart';
import { sigmaWithin, standardDeviationLaw } from './spread-law';
import { baselineOf, type StudyChart, type StudyOptions } from './study-chart';
import { pooledSigma } from './pooled-sigma';

/**
 * A study of runs or lots of several wafers with several sites each. The levels are the runs' means of wafer means, so
 * that a wafer with more sites weighs no more, judged as individuals by their moving ranges: a run, not a wafer, is
 * what varies from one to the next. Then the moving ranges; the standard deviation `between` the wafer means of a run,
 * σ pooled over runs; and the standard deviation `within` each wafer, σ from their mean. D. J. Wheeler and D. S.
 * Chambers, Understanding Statistical Process Control, chapter on three-way charts (from memory).
 *
 * The chart `within` has one point a wafer, all others one a run. `baseline` counts runs. Throws `RangeError` with
 * fewer than two runs, an empty run or wafer, a value that is not finite, no run of two wafers or no wafer of two
 * sites, or a baseline that does not fit.
 */
export function nestedCharts(
  runs: readonly (readonly (readonly number[])[])[],
  options: StudyOptions,
): StudyChart[] {
  const { spreadRules, ...levelOptions } = options;
  const waferMeans = runs.map((wafers) => wafers.map((values) => mean(values)));
  const levels = individualsCharts(
    waferMeans.map((means) => mean(means)),
    levelOptions,
  );
  const baseline = baselineOf(runs, options.baseline);
  const law = standardDeviationLaw;
  const between = pooledSigma(waferMeans.slice(0, baseline.length));
  const within = sigmaWithin(baseline.flat(), law);
  const spreadOptions = { limits: options.limits, ...(spreadRules ? { spreadRules } : {}) };
  return [
    ...levels,
    spreadChart('between', waferMeans, law, { sigma: between, estimator: 'pooled-s' }, spreadOptions),
    spreadChart('within', runs.flat(), law, { sigma: within, estimator: 'mean-s' }, spreadOptions),
  ];
}
