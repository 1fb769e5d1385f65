import { assertFiniteSample } from '@/lib/stats/assert-finite-sample';
import type { SeededRandom } from '@/lib/stats/seeded-random';
import { allowedOnsets } from './allowed-onsets';
import { onsetRatios, type ChangeShape } from './onset-ratios';

/** Since when: points are places in the series, counted from 0. */
export interface Onset {
  shape: ChangeShape;
  /** The point most likely to be the first changed one. */
  first: number;
  /** The size of the change from there: a step in the unit of the values, a drift in that unit per point. */
  size: number;
  /** All points that the values allow as the first changed one, at the stated confidence, rising. */
  set: number[];
}

/**
 * The most likely first point of a change that lasts to the end of the series, and the set of points that may be it. The
 * process is in control about `centre` with `sigma` before; values are independent and normal.
 *
 * A point is in the set unless the best likelihood ratio of all points, given the sum after it that tells the size of
 * the change, is larger than all but a part of what chance makes of it: exact whatever the size (K. J. Worsley,
 * Biometrika 73, 91 (1986); D. Siegmund, International Statistical Review 56, 31 (1988)), simulated with the seeded
 * source `random`. `participants` are the places of the points that made the chart signal: the series was looked at
 * because of them, so chance leaves them as they are.
 *
 * Throws `RangeError` with fewer than two values, one that is not finite, a σ that is not positive and finite, or unless
 * 0 < confidence < 1 and the replicates are at least 100.
 */
export function onset(
  values: ArrayLike<number>,
  { centre, sigma }: { centre: number; sigma: number },
  shape: ChangeShape,
  random: SeededRandom,
  options: { confidence?: number; replicates?: number; participants?: readonly number[] } = {},
): Onset {
  const { confidence = 0.95, replicates = 400, participants = [] } = options;
  assertFiniteSample(values);
  const n = values.length;
  if (n < 2) throw new RangeError(`no change can be placed among ${n} values`);
  if (!(sigma > 0 && Number.isFinite(sigma) && Number.isFinite(centre)))
    throw new RangeError(`no σ of ${sigma}`);
  if (!(confidence > 0 && confidence < 1)) throw new RangeError(`no confidence of ${confidence}`);
  if (!(replicates >= 100)) throw new RangeError('a simulated set needs at least 100 replicates');
  const z = Float64Array.from(values, (value) => (value - centre) / sigma);
  const { sizes, ratios } = onsetRatios(z, shape);
  const first = ratios.indexOf(Math.max(...ratios));
  const held = new Set(participants);
  const noise = Array.from({ length: replicates }, () => Float64Array.from(z, () => random.normal()));
  const allowed = allowedOnsets({ z, held, shape, sizes, ratios, noise, part: 1 - confidence });
  const set = Array.from(z.keys()).filter((t) => t === first || allowed(t));
  return { shape, first, size: (sizes[first] ?? 0) * sigma, set };
}
