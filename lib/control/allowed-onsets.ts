import { shapeSquares, type ChangeShape, type OnsetRatios } from './onset-ratios';

/** A ratio so far below the best is not simulated: chance does not bring it there once in ten thousand times. */
const HOPELESS = 30;

/** The series in σ, its ratios, the places that chance leaves alone, and chance itself. */
export interface OnsetQuestion extends OnsetRatios {
  z: Float64Array;
  held: ReadonlySet<number>;
  shape: ChangeShape;
  noise: readonly Float64Array[];
  /** The part of all series that a set may miss. */
  part: number;
}

/**
 * A test of each point as the first changed one: whether the best ratio of the series is one that chance often enough
 * makes, the change being at that point, the sum that tells its size as it was, and held points as they were. Ratios of
 * held points alone, at the end of the series, are no matter of chance and are left out. See `onset` for the sources.
 */
export function allowedOnsets(question: OnsetQuestion): (t: number) => boolean {
  const { z, held, ratios, noise, part } = question;
  let last = z.length - 1;
  while (last > 0 && held.has(last)) last--;
  const most = ratios.subarray(0, last + 1).reduce((best, ratio) => Math.max(best, ratio), 0);
  const needed = part * (noise.length + 1) - 1;
  return (t) => {
    if (most - (ratios[t] ?? 0) > HOPELESS) return false;
    const reaches = chanceReaches(question, t, last, most);
    let reached = 0;
    for (const [done, series] of noise.entries()) {
      if (reached > needed) return true;
      if (reached + noise.length - done <= needed) return false;
      if (reaches(series)) reached++;
    }
    return reached > needed;
  };
}

/** Whether a series of noise, given the change at t, has a ratio of at least `most` up to the last free point. */
function chanceReaches(
  { z, held, shape, sizes }: OnsetQuestion,
  t: number,
  last: number,
  most: number,
): (noise: Float64Array) => boolean {
  const n = z.length;
  const along = z.map((_, i) => (i < t ? 0 : shape === 'step' ? 1 : i - t + 1));
  const free = z.map((_, i) => (held.has(i) ? 0 : 1));
  const fixed = z.map((value, i) => (held.has(i) ? value : 0));
  const reach = z.map((_, i) => (i === t || i > last ? Infinity : most * shapeSquares(shape, n - i)));
  let needed = (sizes[t] ?? 0) * shapeSquares(shape, n - t);
  let squares = 0;
  for (let i = t; i < n; i++) {
    needed -= (along[i] ?? 0) * (fixed[i] ?? 0);
    squares += (free[i] ?? 0) * (along[i] ?? 0) ** 2;
  }
  return (noise) => {
    let own = 0;
    for (let i = t; i < n; i++) own += (free[i] ?? 0) * (along[i] ?? 0) * (noise[i] ?? 0);
    const moved = squares === 0 ? 0 : (needed - own) / squares;
    let sum = 0;
    let weighted = 0;
    for (let i = n - 1; i >= 0; i--) {
      sum += (fixed[i] ?? 0) + (free[i] ?? 0) * ((noise[i] ?? 0) + moved * (along[i] ?? 0));
      weighted += sum;
      const total = shape === 'step' ? sum : weighted;
      if (total * total >= (reach[i] ?? Infinity)) return true;
    }
    return false;
  };
}
