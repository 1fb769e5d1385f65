/** A change that stays, or one that grows by the same amount from point to point. */
export type ChangeShape = 'step' | 'drift';

/** For each point as the first changed one: the size of the change that fits best, and its weight. */
export interface OnsetRatios {
  /** In σ; of a drift per point, the first changed point being one such amount off. */
  sizes: Float64Array;
  /** Twice the logarithm of the likelihood ratio against no change. */
  ratios: Float64Array;
}

/** Sum of the squares of the shape over its first m points: m, or 1 + 4 + … + m². */
export function shapeSquares(shape: ChangeShape, m: number): number {
  return shape === 'step' ? m : (m * (m + 1) * (2 * m + 1)) / 6;
}

/**
 * How likely each point is to be the first of a change up to the last point, the values `z` being standard normal and
 * independent before it: for a step T. R. Samuel, J. J. Pignatiello and J. A. Calvin, Quality Engineering 10, 521
 * (1998); for a drift M. B. Perry and J. J. Pignatiello, Quality Technology and Quantitative Management 3, 333 (2006),
 * both from memory. From the last point backwards, in one pass.
 */
export function onsetRatios(z: ArrayLike<number>, shape: ChangeShape): OnsetRatios {
  const sizes = new Float64Array(z.length);
  const ratios = new Float64Array(z.length);
  let sum = 0;
  let weighted = 0;
  for (let i = z.length - 1; i >= 0; i--) {
    sum += z[i] ?? 0;
    weighted += sum;
    const along = shape === 'step' ? sum : weighted;
    const squares = shapeSquares(shape, z.length - i);
    sizes[i] = along / squares;
    ratios[i] = (along * along) / squares;
  }
  return { sizes, ratios };
}
