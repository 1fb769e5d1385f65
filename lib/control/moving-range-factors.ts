/** d2 of two values: the mean moving range of independent normal values is 2/√π of their σ. */
export const MEAN_RANGE_OF_TWO = 2 / Math.sqrt(Math.PI);
/** Upper limit of a moving range over its mean, 0.27 % beyond: a half-normal value 3 σ out, 3·√2/d2 = 3.760. */
export const MOVING_RANGE_PROBABILITY = (3 * Math.SQRT2) / MEAN_RANGE_OF_TWO;
/** The classical factor D4(2) = 1 + 3·d3/d2 = 3.267 (ASTM MNL7); about 0.9 % of moving ranges lie beyond. */
export const MOVING_RANGE_CLASSICAL = 1 + (3 * Math.sqrt(2 - 4 / Math.PI)) / MEAN_RANGE_OF_TWO;
