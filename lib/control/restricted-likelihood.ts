import type { NestedLevels } from './nested-levels';

/** −2·ln of the restricted likelihood (but for a constant), and of it the slope by each variance in its two parts. */
export interface RestrictedLikelihood {
  value: number;
  /** tr(P·Vₖ): what the variance costs. Where it equals `pull` the likelihood is level. */
  cost: number[];
  /** yᵀP·Vₖ·P·y: what the data ask of it. */
  pull: number[];
}

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
  const wide = size + 1;
  const residual = variances[size - 1] ?? 1;
  /** What each group tells the one around it: 1ᵀV⁻¹1, 1ᵀV⁻¹y, yᵀV⁻¹y and ln|V|, each followed by its slopes. */
  let told = new Float64Array(innermost.length * 4 * wide);
  innermost.forEach(({ group: { count, mean }, squares }, i) => {
    const sums = [count, count * mean, squares + count * mean * mean];
    sums.forEach((sum, part) => {
      told[(4 * i + part) * wide] = sum / residual;
      told[(4 * i + part) * wide + size] = -sum / residual ** 2;
    });
    told[(4 * i + 3) * wide] = count * Math.log(residual);
    told[(4 * i + 3) * wide + size] = count / residual;
  });
  for (let j = size - 2; j >= 0; j--) {
    const level = groups[j] ?? [];
    const outside = new Float64Array((j === 0 ? 1 : (groups[j - 1]?.length ?? 0)) * 4 * wide);
    for (let i = 0; i < level.length; i++) {
      const own = 4 * wide * i;
      addVariance(told, own, wide, variances[j] ?? 0, j + 1);
      const around = 4 * wide * (level[i]?.parent ?? 0);
      for (let k = 0; k < 4 * wide; k++)
        outside[around + k] = (outside[around + k] ?? 0) + (told[own + k] ?? 0);
    }
    told = outside;
  }
  const [ones, cross, square, log] = [0, 1, 2, 3].map((part) =>
    told.subarray(part * wide, (part + 1) * wide),
  );
  const [a, b] = [ones?.[0] ?? 1, cross?.[0] ?? 0];
  const slopes = variances.map((_, k) => k + 1);
  return {
    value: (log?.[0] ?? 0) + Math.log(a) + (square?.[0] ?? 0) - (b * b) / a,
    cost: slopes.map((k) => (log?.[k] ?? 0) + (ones?.[k] ?? 0) / a),
    pull: slopes.map(
      (k) => -(square?.[k] ?? 0) + (2 * b * (cross?.[k] ?? 0)) / a - (b * b * (ones?.[k] ?? 0)) / (a * a),
    ),
  };
}

/** A group's own variance s put on top of what its members told, from `at` on; `own` is the slope by s itself. */
function addVariance(told: Float64Array, at: number, wide: number, s: number, own: number): void {
  const [ones, cross, square, log] = [at, at + wide, at + 2 * wide, at + 3 * wide];
  const a = told[ones] ?? 0;
  const b = told[cross] ?? 0;
  const d = 1 + s * a;
  for (let k = 1; k < wide; k++) {
    const da = told[ones + k] ?? 0;
    const db = told[cross + k] ?? 0;
    const dd = s * da + (k === own ? a : 0);
    told[ones + k] = (da - (a * dd) / d) / d;
    told[cross + k] = (db - (b * dd) / d) / d;
    const grown = s * 2 * b * db + (k === own ? b * b : 0) - (s * b * b * dd) / d;
    told[square + k] = (told[square + k] ?? 0) - grown / d;
    told[log + k] = (told[log + k] ?? 0) + dd / d;
  }
  told[ones] = a / d;
  told[cross] = b / d;
  told[square] = (told[square] ?? 0) - (s * b * b) / d;
  told[log] = (told[log] ?? 0) + Math.log(d);
}
