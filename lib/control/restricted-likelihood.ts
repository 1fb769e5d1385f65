import type { NestedLevels } from './nested-levels';

/** −2·ln of the restricted likelihood (but for a constant), and of it the slope by each variance in its two parts. */
export interface RestrictedLikelihood {
  value: number;
  /** tr(P·Vₖ): what the variance costs. Where it equals `pull` the likelihood is level. */
  cost: number[];
  /** yᵀP·Vₖ·P·y: what the data ask of it. */
  pull: number[];
}

/** What a group tells the group around it: 1ᵀV⁻¹1, 1ᵀV⁻¹y, yᵀV⁻¹y, ln|V|, each followed by its slopes. */
type Told = [ones: Float64Array, cross: Float64Array, square: Float64Array, log: Float64Array];

/**
 * The restricted likelihood of values in groups within groups whose levels have the given variances, the innermost last
 * (H. D. Patterson and R. Thompson, Biometrika 58, 545 (1971)). No matrix is built: a group with its own variance σ²
 * adds σ²·11ᵀ to what its members have, which changes all four sums by one division
 * (J. Sherman and W. J. Morrison, Ann. Math. Statist. 21, 124 (1950)); slopes are carried along.
 */
export function restrictedLikelihood(
  { groups, innermost }: NestedLevels,
  variances: readonly number[],
): RestrictedLikelihood {
  const size = variances.length;
  const told = (): Told => [0, 1, 2, 3].map(() => new Float64Array(size + 1)) as Told;
  const residual = variances[size - 1] ?? 1;
  let level = innermost.map(({ group: { count, mean }, squares }) => {
    const sums = told();
    [count, count * mean, squares + count * mean * mean].forEach((sum, part) => {
      add(sums[part], 0, sum / residual);
      add(sums[part], size, -sum / residual ** 2);
    });
    add(sums[3], 0, count * Math.log(residual));
    add(sums[3], size, count / residual);
    return sums;
  });
  for (let j = size - 2; j >= 0; j--) {
    const outside = Array.from({ length: j === 0 ? 1 : (groups[j - 1]?.length ?? 0) }, told);
    level.forEach((member, i) => {
      withVariance(member, variances[j] ?? 0, j + 1);
      const sum = outside[groups[j]?.[i]?.parent ?? 0];
      member.forEach((list, part) => list.forEach((v, k) => add(sum?.[part], k, v)));
    });
    level = outside;
  }
  const [ones, cross, square, log] = level[0] ?? told();
  const [a, b] = [ones[0] ?? 1, cross[0] ?? 0];
  const slopes = variances.map((_, k) => k + 1);
  return {
    value: (log[0] ?? 0) + Math.log(a) + (square[0] ?? 0) - (b * b) / a,
    cost: slopes.map((k) => (log[k] ?? 0) + (ones[k] ?? 0) / a),
    pull: slopes.map(
      (k) => -(square[k] ?? 0) + (2 * b * (cross[k] ?? 0)) / a - (b * b * (ones[k] ?? 0)) / (a * a),
    ),
  };
}

function add(list: Float64Array | undefined, k: number, value: number): void {
  if (list) list[k] = (list[k] ?? 0) + value;
}

/** A group's own variance s put on top of what its members told, and the slopes with it; `own` is the slope by s. */
function withVariance([ones, cross, square, log]: Told, s: number, own: number): void {
  const [a, b] = [ones[0] ?? 0, cross[0] ?? 0];
  const d = 1 + s * a;
  for (let k = 1; k < ones.length; k++) {
    const [da, db] = [ones[k] ?? 0, cross[k] ?? 0];
    const dd = s * da + (k === own ? a : 0);
    ones[k] = (da - (a * dd) / d) / d;
    cross[k] = (db - (b * dd) / d) / d;
    square[k] = (square[k] ?? 0) - (s * 2 * b * db + (k === own ? b * b : 0) - (s * b * b * dd) / d) / d;
    log[k] = (log[k] ?? 0) + dd / d;
  }
  ones[0] = a / d;
  cross[0] = b / d;
  square[0] = (square[0] ?? 0) - (s * b * b) / d;
  log[0] = (log[0] ?? 0) + Math.log(d);
}
