import { fUpperTail } from '@/lib/stats/f-distribution';
import type { NestedGroup, NestedLevels } from './nested-levels';

/** A weighted sum of mean squares, with the degrees of freedom that Satterthwaite gives it. */
export interface MeanSquare {
  value: number;
  degreesOfFreedom: number;
}

/** One row of a nested analysis of variance. What the data cannot give is null. */
export interface AnovaRow {
  name: string;
  degreesOfFreedom: number;
  sumOfSquares: number;
  meanSquare: number | null;
  /** What the mean square would be without this level's own variance; null for the innermost. */
  error: MeanSquare | null;
  f: number | null;
  p: number | null;
  /** How many times this level's variance is in its mean square. */
  multiple: number | null;
  /** The estimate of the level's variance, which may come out negative. */
  estimate: number | null;
}

/**
 * The analysis of variance of groups within groups, balanced or not: sums of squares level by level; components by
 * setting each mean square equal to its expectation (S. R. Searle, G. Casella and C. E. McCulloch, Variance Components
 * (1992), section 5.3; the multiples after C. E. Gates and C. Shiue, Biometrics 18, 529 (1962), both from memory). F
 * divides by what the mean square would be without the level's own variance: with equal groups the mean square below,
 * else a weighted sum of those below with degrees of freedom after F. E. Satterthwaite, Biometrics Bulletin 2, 110
 * (1946).
 *
 * A level without degrees of freedom has no mean square, and it and the levels around it have no component.
 */
export function nestedAnova({ names, groups }: NestedLevels): AnovaRow[] {
  const levels = groups.length;
  const whole: NestedGroup[] = [{ parent: 0, count: groups.at(-1)?.length ?? 0, mean: 0 }];
  const freedoms = groups.map((level, j) => level.length - (groups[j - 1] ?? whole).length);
  const squares = groups.map((level, j) => sumOfSquares(level, groups[j - 1] ?? whole));
  const meanSquares = squares.map((sum, j) => (freedoms[j] === 0 ? null : sum / (freedoms[j] ?? 1)));
  const multiples = groups.map((_, j) =>
    groups.map((_, k) => {
      if (k < j || freedoms[j] === 0) return 0;
      return (shared(groups, k, j) - shared(groups, k, j - 1)) / (freedoms[j] ?? 1);
    }),
  );
  const combined = (weights: readonly number[]): MeanSquare | null => {
    const parts = weights.map((weight, i) => weight * (meanSquares[i] ?? 0));
    const value = parts.reduce((sum, part) => sum + part, 0);
    const spread = parts.reduce((sum, part, i) => sum + (part === 0 ? 0 : part ** 2 / (freedoms[i] ?? 1)), 0);
    return value > 0 ? { value, degreesOfFreedom: value ** 2 / spread } : null;
  };
  /** Each component, and each error, as weights of the mean squares; from the innermost level outwards. */
  const components = new Array<number[] | null>(levels).fill(null);
  const errors = new Array<number[] | null>(levels).fill(null);
  for (let j = levels - 1; j >= 0; j--) {
    const below = components.slice(j + 1);
    if (meanSquares[j] === null || below.includes(null)) continue;
    const own = multiples[j]?.[j] ?? 0;
    const error = groups.map((_, i) =>
      below.reduce((sum, weights, m) => sum + (multiples[j]?.[j + 1 + m] ?? 0) * (weights?.[i] ?? 0), 0),
    );
    errors[j] = error;
    components[j] = error.map((weight, i) => ((i === j ? 1 : 0) - weight) / own);
  }
  return names.map((name, j) => {
    const meanSquare = meanSquares[j] ?? null;
    const freedom = freedoms[j] ?? 0;
    const error = j === levels - 1 || !errors[j] ? null : combined(errors[j] ?? []);
    const f = meanSquare === null || error === null ? null : meanSquare / error.value;
    const weights = components[j];
    return {
      name,
      degreesOfFreedom: freedom,
      sumOfSquares: squares[j] ?? 0,
      meanSquare,
      error,
      f,
      p: f === null || error === null ? null : fUpperTail(f, freedom, error.degreesOfFreedom),
      multiple: weights ? (multiples[j]?.[j] ?? null) : null,
      estimate: weights ? weights.reduce((sum, weight, i) => sum + weight * (meanSquares[i] ?? 0), 0) : null,
    };
  });
}

function sumOfSquares(level: readonly NestedGroup[], outside: readonly NestedGroup[]): number {
  return level.reduce(
    (sum, { parent, count, mean }) => sum + count * (mean - (outside[parent]?.mean ?? 0)) ** 2,
    0,
  );
}

/** Σ n²/N over the groups of level k, N the size of the group around each at level j (−1: all values). */
function shared(groups: readonly NestedGroup[][], k: number, j: number): number {
  const all = groups.at(-1)?.length ?? 0;
  return (groups[k] ?? []).reduce((sum, group) => {
    let around: NestedGroup | undefined = group;
    for (let level = k; level > j && level > 0; level--) around = groups[level - 1]?.[around?.parent ?? 0];
    return sum + group.count ** 2 / (j < 0 ? all : (around?.count ?? all));
  }, 0);
}
