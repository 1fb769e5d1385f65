import { mean } from '@/lib/stats/mean';
import { individualsCharts } from './individuals-charts';
import { spreadChart } from './spread-chart';
import { sigmaWithin, standardDeviationLaw } from './spread-law';
import { baselineOf, limitSignals, type StudyChart, type StudyOptions } from './study-chart';
import { withinLimits } from './within-limits';

/**
 * A study of subgroups whose spread within is not what moves their means, as with the sites of a wafer: the means
 * as individuals with limits from their moving ranges, the moving ranges, and the standard deviation `within` each
 * subgroup (D. J. Wheeler and D. S. Chambers, Understanding Statistical Process Control, chapter on three-way
 * charts, from memory). `classical` limits of the spread within are B3 and B4 (ASTM MNL7), which take the values in
 * a subgroup as independent. `probability` limits are lognormal, from how the spread itself has varied; with fewer
 * than two positive spreads in the baseline they are the chi-square ones.
 *
 * Throws `RangeError` with fewer than two subgroups, an empty one, a value that is not finite, no subgroup of two
 * values, or a baseline that does not fit.
 */
export function threeWayCharts(
  subgroups: readonly (readonly number[])[],
  options: StudyOptions,
): StudyChart[] {
  const levels = individualsCharts(
    subgroups.map((values) => mean(values)),
    options,
  );
  const baseline = baselineOf(subgroups, options.baseline);
  const law = standardDeviationLaw;
  const spreads = subgroups.map((values) => law.of(values));
  const lognormal =
    options.limits === 'probability'
      ? withinLimits(
          baseline.map((_, i) => ({ level: 0, within: spreads[i] ?? null, between: null, wafers: 1 })),
        )
      : null;
  if (!lognormal) {
    const within = { sigma: sigmaWithin(baseline, law), estimator: 'mean-s' as const };
    return [...levels, spreadChart('within', subgroups, law, within, options)];
  }
  if (options.spreadRules && options.spreadRules.length > 0)
    throw new RangeError('a spread with lognormal limits is judged by its limits alone');
  const { lower, centre, upper, logSigma } = lognormal;
  const everywhere = (limit: number) => spreads.map(() => limit);
  return [
    ...levels,
    {
      name: 'within',
      estimator: 'log-spread',
      centre,
      upper,
      lower,
      sigma: centre * Math.exp(logSigma ** 2 / 2) * Math.sqrt(Math.expm1(logSigma ** 2)),
      points: spreads,
      signals: limitSignals(spreads, everywhere(lower), everywhere(upper)),
    },
  ];
}
