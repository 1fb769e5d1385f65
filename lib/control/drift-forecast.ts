import { mannKendall, type MannKendall } from '@/lib/stats/mann-kendall';
import type { SeededRandom } from '@/lib/stats/seeded-random';
import { theilSen, type TheilSen } from '@/lib/stats/theil-sen';
import { crossingForecast, type CrossingForecast, type ForecastProcess } from './crossing-forecast';

/** How fast a drift is and when it will pass its limits. */
export interface DriftForecast {
  /** Slope per point since the onset with its 95 % interval; null with fewer than four points. */
  slope: TheilSen | null;
  trend: MannKendall | null;
  /** Whether the slope's interval lies on one side of zero: else a crossing can only be said to come "not before". */
  certain: boolean;
  /** One for each limit asked for; middle and high are null unless the slope is certain and leads there. */
  crossings: { limit: number; forecast: CrossingForecast }[];
}

/**
 * How fast a drift is since its onset and how long until it passes each of the limits on its way, the control limit and
 * the specification. The slope is that of Theil and Sen, tested by Mann and Kendall; the crossings are those of
 * `crossingForecast`, which allow for scatter, autocorrelation and the choice of the onset. Where the slope's interval
 * includes zero, or leads away from the limit, only the lower end is kept: not before.
 *
 * `first` is the place of the first changed point in `values`, counted from 0. Throws `RangeError` as `crossingForecast`
 * does, or where there is no such point.
 */
export function driftForecast(
  values: readonly number[],
  first: number,
  course: ForecastProcess,
  limits: readonly number[],
  random: SeededRandom,
): DriftForecast {
  if (!Number.isInteger(first) || first < 0 || first >= values.length) {
    throw new RangeError(`there is no point ${first} among ${values.length}`);
  }
  const since = values.slice(first);
  const slope = theilSen(
    since.map((_, i) => i),
    since,
  );
  const certain = slope !== null && slope.low * slope.high > 0;
  const crossings = limits.map((limit) => {
    const forecast = crossingForecast(values, course, limit, random);
    const leads = certain && slope.slope * (limit - course.centre) > 0;
    return { limit, forecast: leads ? forecast : notBefore(forecast) };
  });
  return { slope, trend: mannKendall(since), certain, crossings };
}

function notBefore({ points, hours }: CrossingForecast): CrossingForecast {
  return {
    points: { low: points.low, middle: null, high: null },
    hours: hours && { low: hours.low, middle: null, high: null },
  };
}
