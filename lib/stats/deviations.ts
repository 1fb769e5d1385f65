import { assertFiniteSample } from './assert-finite-sample';

/** A sample as one origin and the distance of every value from it. */
export interface Deviations {
  origin: number;
  values: Float64Array;
}

/** Spread below this part of the level: the rounding of the doubles themselves is felt in the tenth digit. */
const NARROW = 1e-6;

/**
 * The sample shifted to its own first value, the start of every sum that matters: a spread of 0.1 on a level of
 * ten million survives, where sums of squares of the raw values lose every digit (T. F. Chan, G. H. Golub and
 * R. J. LeVeque, The American Statistician 37, 242 (1983), recommend the shift).
 *
 * Where the spread is under a millionth of the level, each distance is read as the decimal number that was
 * written: 10000000.3 − 10000000.2 is 0.1, not the 0.10000000149 that the nearest doubles give. The grid is the
 * finest power of ten that two roundings cannot blur, and never coarser than one.
 *
 * Undefined for an empty sample: throws `RangeError`, as it does for a value that is not finite.
 */
export function deviations(sample: ArrayLike<number>): Deviations {
  assertFiniteSample(sample);
  const origin = sample[0];
  if (origin === undefined) throw new RangeError('an empty sample has no deviations');
  const values = new Float64Array(sample.length);
  let widest = 0;
  for (let i = 0; i < sample.length; i++) {
    const distance = (sample[i] ?? 0) - origin;
    values[i] = distance;
    widest = Math.max(widest, Math.abs(distance));
  }
  if (!Number.isFinite(widest)) throw new RangeError('the sample spans more than a double can hold');
  if (widest > 0 && widest < NARROW * Math.abs(origin)) readAsDecimals(values, origin);
  return { origin, values };
}

function readAsDecimals(values: Float64Array, origin: number): void {
  const spacing = 2 ** (Math.floor(Math.log2(Math.abs(origin))) - 52);
  const decimals = Math.floor(-Math.log10(2 * spacing));
  if (decimals < 0 || decimals > 300) return;
  const perUnit = 10 ** decimals;
  for (let i = 0; i < values.length; i++) {
    const scaled = Math.round((values[i] ?? 0) * perUnit);
    if (Math.abs(scaled) <= Number.MAX_SAFE_INTEGER) values[i] = scaled / perUnit;
  }
}
