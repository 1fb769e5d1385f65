import { assertFiniteSample } from '@/lib/stats/assert-finite-sample';
import { quantile } from '@/lib/stats/quantile';
import type { SeededRandom } from '@/lib/stats/seeded-random';
import { onsetRatios, shapeSquares } from './onset-ratios';

/** How far ahead: low, middle and high of a 95 % predictive interval; null where it lies beyond the horizon. */
export interface Ahead {
  low: number | null;
  middle: number | null;
  high: number | null;
}

export interface CrossingForecast {
  points: Ahead;
  /** Where the hours between points are known. */
  hours: Ahead | null;
}

/** What a forecast needs to know of the process. */
export interface ForecastProcess {
  centre: number;
  sigma: number;
  /** Lag-one autocorrelation of the values in control; 0 where they are independent. */
  autocorrelation: number;
  /** Hours from point to point as they have been, in any number. */
  gapsHours: readonly number[];
}

/**
 * When a drift will put a point beyond a limit: the number of points until the first one beyond, and the hours, as 95 %
 * predictive intervals. Futures are drawn with the seeded source: the onset by its likelihood, the slope about the one
 * that fits it best, and the scatter of the points to come, following on from the last one. Autocorrelated noise counts
 * for (1 − φ)/(1 + φ) as many points when onset and slope are judged (M. S. Bartlett, J. Royal Statistical Society 98,
 * 536 (1935)). Onset and slope are drawn from their posterior under flat priors (A. F. M. Smith, Biometrika 62, 407
 * (1975)). Hours are made of gaps drawn from those that have been.
 *
 * Throws `RangeError` with fewer than four values, one that is not finite, a σ that is not positive, an autocorrelation
 * that is not within −1 and 1, a gap that is not positive, or a limit at the centre.
 */
export function crossingForecast(
  values: ArrayLike<number>,
  course: ForecastProcess,
  limit: number,
  random: SeededRandom,
  { draws = 800, horizonPoints = 1000 }: { draws?: number; horizonPoints?: number } = {},
): CrossingForecast {
  const { centre, sigma, autocorrelation: phi, gapsHours } = course;
  assertFiniteSample(values);
  const n = values.length;
  if (n < 4) throw new RangeError(`no forecast from ${n} values`);
  if (!(sigma > 0 && Number.isFinite(sigma))) throw new RangeError(`no σ of ${sigma}`);
  if (!(Math.abs(phi) < 1)) throw new RangeError(`no autocorrelation of ${phi}`);
  if (gapsHours.some((gap) => !(gap > 0 && Number.isFinite(gap))))
    throw new RangeError('gaps are above zero');
  const bound = (limit - centre) / sigma;
  if (!(Number.isFinite(bound) && bound !== 0)) throw new RangeError(`no forecast of the limit ${limit}`);
  const side = Math.sign(bound);
  const z = Float64Array.from(values, (value) => (side * (value - centre)) / sigma);
  const { sizes, ratios } = onsetRatios(z, 'drift');
  const inflation = (1 + phi) / (1 - phi);
  const most = ratios.reduce((best, ratio) => Math.max(best, ratio), 0);
  const weights = Array.from(ratios, (ratio, t) =>
    n - t < 2 ? 0 : Math.exp((ratio - most) / (2 * inflation)) / Math.sqrt(shapeSquares('drift', n - t)),
  );
  const total = weights.reduce((sum, weight) => sum + weight, 0);
  const points: number[] = [];
  const hours: number[] = [];
  const innovation = Math.sqrt(1 - phi * phi);
  for (let draw = 0; draw < draws; draw++) {
    const t = drawn(weights, random.uniform() * total);
    const slope = (sizes[t] ?? 0) + random.normal() * Math.sqrt(inflation / shapeSquares('drift', n - t));
    let noise = (z[n - 1] ?? 0) - slope * (n - t);
    let spent = 0;
    let ahead = 1;
    for (; ahead <= horizonPoints; ahead++) {
      noise = phi * noise + innovation * random.normal();
      if (gapsHours.length > 0) spent += gapsHours[Math.floor(random.uniform() * gapsHours.length)] ?? 0;
      if (slope * (n - t + ahead) + noise > Math.abs(bound)) break;
    }
    points.push(ahead);
    hours.push(ahead > horizonPoints ? Number.MAX_VALUE : spent);
  }
  const within = (value: number, most: number): number | null => (value > most ? null : value);
  const ahead = (list: readonly number[], most: number): Ahead => ({
    low: within(quantile(list, 0.025), most),
    middle: within(quantile(list, 0.5), most),
    high: within(quantile(list, 0.975), most),
  });
  return {
    points: ahead(points, horizonPoints),
    hours: gapsHours.length > 0 ? ahead(hours, horizonPoints * Math.max(...gapsHours)) : null,
  };
}

/** The place at which the running sum of the weights passes `target`. */
function drawn(weights: readonly number[], target: number): number {
  let left = target;
  const place = weights.findIndex((weight) => (left -= weight) < 0);
  return place < 0 ? weights.findLastIndex((weight) => weight > 0) : place;
}
