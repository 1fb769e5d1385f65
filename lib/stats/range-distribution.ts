import { standardNormalCdf, standardNormalDensity } from './standard-normal';

/** Grid of the integrals over the normal curve, in σ. Beyond 8 σ nothing is left in fifteen digits. */
const STEP = 0.04;
const REACH = 8;
const POINTS = Math.round((2 * REACH) / STEP) + 1;

const below = Float64Array.from({ length: POINTS }, (_, i) => standardNormalCdf(-REACH + i * STEP));
const density = Float64Array.from({ length: POINTS }, (_, i) => standardNormalDensity(-REACH + i * STEP));

/**
 * The probability that the range of n independent standard normal values stays below w:
 * P = n ∫ φ(x)·[Φ(x + w) − Φ(x)]ⁿ⁻¹ dx (L. H. C. Tippett, Biometrika 17, 364 (1925)). The trapezoid rule is
 * exact here to about ten digits, for the integrand dies away smoothly on both sides.
 *
 * Throws `RangeError` unless n is a whole number of at least 2 and w is finite.
 */
export function rangeCdf(w: number, n: number): number {
  assertSize(n);
  if (!Number.isFinite(w)) throw new RangeError(`no range probability at ${w}`);
  if (w <= 0) return 0;
  let sum = 0;
  for (let i = 0; i < POINTS; i++) {
    const x = -REACH + i * STEP;
    sum += (density[i] ?? 0) * (standardNormalCdf(x + w) - (below[i] ?? 0)) ** (n - 1);
  }
  return Math.min(1, n * STEP * sum);
}

/**
 * The range that n independent standard normal values stay under with probability p, by bisection.
 *
 * Throws `RangeError` unless 0 < p < 1 and n is a whole number of at least 2.
 */
export function rangeQuantile(p: number, n: number): number {
  if (!(p > 0 && p < 1)) throw new RangeError(`a quantile needs a probability between 0 and 1, not ${p}`);
  let lower = 0;
  let upper = 2 * REACH;
  while (upper - lower > 1e-10) {
    const middle = (lower + upper) / 2;
    if (rangeCdf(middle, n) < p) lower = middle;
    else upper = middle;
  }
  return (lower + upper) / 2;
}

const known = new Map<number, { d2: number; d3: number }>();

/**
 * d2 and d3: mean and standard deviation of the range of n independent normal values, in units of their σ.
 * Computed from the distribution, not tabulated: d2 = ∫ P(W > w) dw and d2² + d3² = 2 ∫ w·P(W > w) dw, by
 * Simpson's rule; agreement with the table of ASTM MNL7 is tested. Each n is computed once.
 *
 * Throws `RangeError` unless n is a whole number of at least 2.
 *
 * @example rangeConstants(5).d2 // 2.32592895
 */
export function rangeConstants(n: number): { d2: number; d3: number } {
  assertSize(n);
  const found = known.get(n);
  if (found) return found;
  let mean = 0;
  let square = 0;
  for (let j = 0; j < POINTS; j++) {
    const weight = (j === 0 || j === POINTS - 1 ? 1 : j % 2 === 1 ? 4 : 2) * (STEP / 3);
    const beyond = 1 - gridCdf(j, n);
    mean += weight * beyond;
    square += weight * 2 * j * STEP * beyond;
  }
  const constants = { d2: mean, d3: Math.sqrt(square - mean * mean) };
  known.set(n, constants);
  return constants;
}

/** `rangeCdf` at j grid steps, without evaluating the normal curve anew. */
function gridCdf(j: number, n: number): number {
  let sum = 0;
  for (let i = 0; i < POINTS; i++) {
    const reached = i + j < POINTS ? (below[i + j] ?? 1) : 1;
    sum += (density[i] ?? 0) * (reached - (below[i] ?? 0)) ** (n - 1);
  }
  return n * STEP * sum;
}

function assertSize(n: number): void {
  if (!Number.isInteger(n) || n < 2) {
    throw new RangeError(`a range needs a whole number of at least 2 values, not ${n}`);
  }
}
