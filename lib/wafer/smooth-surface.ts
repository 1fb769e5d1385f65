import { turned } from './mirror';
import type { Site } from './site';
import { bending, type SplineBasis, splineBasis } from './spline-basis';
import { tridiagonalSolve } from './tridiagonal-solve';

/** A smooth surface through the readings of one wafer: its value at any place, in mm from the centre. */
export interface SmoothSurface {
  (xMm: number, yMm: number): number;
  /** The surface's own numbers: `plane` over 1, x, y and a weight for the bending about each site, places over `scaleMm`. */
  plane: Float64Array;
  weights: Float64Array;
  basis: SplineBasis;
}

/** Natural logarithms of the least and most smoothing tried: through every reading, and all but a plane. */
const LEAST_SMOOTHING = Math.log(1e-12);
const MOST_SMOOTHING = Math.log(1e6);
/** Half a percent short of the gauge's scatter is close enough for a drawing; beyond it is not. */
const CLOSE_ENOUGH = -0.005;

/**
 * The thin-plate smoothing spline of the readings (Duchon 1977; Wahba, Spline Models for
 * Observational Data (1990), from memory), as stiff as the gauge allows and no stiffer: the root mean
 * square of what it leaves of the readings comes to `repeatability`, in the unit of the readings, or
 * at most half a percent less (Reinsch, Numer. Math. 10, 177 (1967), from memory). 0 goes through every reading. Where a plane
 * leaves less than that, it is the plane.
 *
 * Null where the sites do not span a surface: fewer than three, or all on one line. Throws a
 * RangeError on readings that are not finite or a repeatability below 0.
 */
export function smoothSurface(
  sites: readonly Site[],
  readings: readonly number[],
  repeatability: number,
): SmoothSurface | null {
  const n = sites.length;
  if (readings.length !== n) throw new RangeError(`${readings.length} readings for ${n} sites`);
  if (!readings.every(Number.isFinite)) throw new RangeError('a surface needs finite readings');
  if (!(repeatability >= 0)) throw new RangeError(`repeatability must be 0 or more: ${repeatability}`);
  const basis = splineBasis(sites);
  if (basis === null) return null;
  const seen = Float64Array.from(readings);
  turned(basis.mirrors, seen);
  const bent = bendingWeights(basis, seen.subarray(3), repeatability);
  const plane = planeUnder(basis, seen, bent);
  const weights = new Float64Array(n);
  weights.set(bent, 3);
  turned(basis.mirrors.toReversed(), weights);
  const { scaleMm, x, y } = basis;
  const valueAt = (xMm: number, yMm: number) => {
    const u = xMm / scaleMm;
    const v = yMm / scaleMm;
    let value = plane[0]! + plane[1]! * u + plane[2]! * v;
    for (let i = 0; i < n; i++) value += weights[i]! * bending((u - x[i]!) ** 2 + (v - y[i]!) ** 2);
    return value;
  };
  return Object.assign(valueAt, { plane, weights, basis });
}

/** The plane that the readings leave once they are bent. */
function planeUnder({ plane, across }: SplineBasis, seen: Float64Array, bent: Float64Array): Float64Array {
  const found = Float64Array.from(across, (row, k) =>
    row.reduce((value, bend, j) => value - bend * bent[j]!, seen[k]!),
  );
  for (let k = 2; k >= 0; k--) {
    for (let j = k + 1; j < 3; j++) found[k]! -= plane[j]![k]! * found[j]!;
    found[k]! /= plane[k]![k]!;
  }
  return found;
}

/** The weights off the plane at the smoothing that leaves the gauge's scatter; all zero for a plane. */
function bendingWeights(
  { diagonal, beside, x }: SplineBasis,
  readings: Float64Array,
  repeatability: number,
): Float64Array {
  const left = (column: Float64Array, factor: number) =>
    factor * Math.sqrt(column.reduce((sum, value) => sum + value * value, 0) / x.length);
  const flatLeft = left(readings, 1);
  const none = new Float64Array(readings.length);
  if (flatLeft <= repeatability || flatLeft === 0) return none;
  const solved = (lambda: number) => tridiagonalSolve(diagonal, beside, lambda, readings) ?? none;
  let low = LEAST_SMOOTHING;
  let best = solved(Math.exp(low));
  if (left(best, Math.exp(low)) >= repeatability) return best;
  let high = MOST_SMOOTHING;
  let [lowGap, highGap] = [
    Math.log(1e-300 + left(best, Math.exp(low)) / repeatability),
    Math.log(flatLeft / repeatability),
  ];
  for (let step = 0; step < 60 && high - low > 1e-6; step++) {
    const share = lowGap / (lowGap - highGap);
    const middle = step % 3 === 2 ? (low + high) / 2 : low + share * (high - low);
    const tried = solved(Math.exp(middle));
    const gap = Math.log(left(tried, Math.exp(middle)) / repeatability);
    if (gap > 0) [high, highGap] = [middle, gap];
    else [low, lowGap, best] = [middle, gap, tried];
    if (gap <= 0 && gap > CLOSE_ENOUGH) break;
  }
  return best;
}
