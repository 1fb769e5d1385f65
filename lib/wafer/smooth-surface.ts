import { positiveSolve } from './positive-solve';
import type { Site } from './site';

/** A smooth surface through the readings of one wafer: its value at any place, in mm from the centre. */
export type SmoothSurface = (xMm: number, yMm: number) => number;

/** Natural logarithms of the least and most smoothing tried: through every reading, and all but a plane. */
const LEAST_SMOOTHING = Math.log(1e-12);
const MOST_SMOOTHING = Math.log(1e6);
/** Half a percent short of the gauge's scatter is close enough for a drawing; beyond it is not. */
const CLOSE_ENOUGH = -0.005;

/** r²·ln r of the squared distance: the bending of a thin plate held at one point. */
function bending(squared: number): number {
  return squared > 0 ? 0.5 * squared * Math.log(squared) : 0;
}

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
  if (n < 3) return null;
  const scaleMm = Math.max(...sites.map((s) => Math.hypot(s.xMm, s.yMm))) || 1;
  const x = Float64Array.from(sites, (s) => s.xMm / scaleMm);
  const y = Float64Array.from(sites, (s) => s.yMm / scaleMm);
  const plane = [new Float64Array(n).fill(1), x.slice(), y.slice()];
  const mirrors = triangularised(plane);
  if (mirrors === null) return null;

  const turned = Float64Array.from(readings);
  turn(mirrors, turned);
  const kernel = turnedKernel(mirrors, x, y);
  const bent = bendingWeights(kernel, turned.subarray(3), repeatability, n);
  const offset = [0, 1, 2].map((k) => {
    let value = turned[k]!;
    for (let j = 0; j < n - 3; j++) value -= kernel[k]![j + 3]! * bent[j]!;
    return value;
  });
  for (let k = 2; k >= 0; k--) {
    for (let j = k + 1; j < 3; j++) offset[k]! -= plane[j]![k]! * offset[j]!;
    offset[k]! /= plane[k]![k]!;
  }
  const weights = new Float64Array(n);
  weights.set(bent, 3);
  turn([...mirrors].reverse(), weights);
  return (xMm, yMm) => {
    const u = xMm / scaleMm;
    const v = yMm / scaleMm;
    let value = offset[0]! + offset[1]! * u + offset[2]! * v;
    for (let i = 0; i < n; i++) value += weights[i]! * bending((u - x[i]!) ** 2 + (v - y[i]!) ** 2);
    return value;
  };
}

/** Mirrors a column in each of the given unit vectors (Householder): v - 2·m·(m·v). */
function turn(mirrors: readonly Float64Array[], column: Float64Array): void {
  for (const mirror of mirrors) {
    let along = 0;
    for (let i = 0; i < column.length; i++) along += mirror[i]! * column[i]!;
    for (let i = 0; i < column.length; i++) column[i]! -= 2 * along * mirror[i]!;
  }
}

/** Turns three columns into an upper triangle, in place; the mirrors that do it, or null where they are not independent. */
function triangularised(columns: readonly Float64Array[]): Float64Array[] | null {
  const mirrors: Float64Array[] = [];
  for (let k = 0; k < columns.length; k++) {
    const column = columns[k]!;
    const mirror = column.map((value, i) => (i < k ? 0 : value));
    const length = Math.hypot(...mirror);
    if (length < 1e-6) return null;
    mirror[k]! += mirror[k]! < 0 ? -length : length;
    const scale = Math.hypot(...mirror);
    for (let i = 0; i < mirror.length; i++) mirror[i]! /= scale;
    for (const other of columns.slice(k)) turn([mirror], other);
    mirrors.push(mirror);
  }
  return mirrors;
}

/** The bending between every two sites, seen along the turned axes: the first three are the plane. */
function turnedKernel(mirrors: readonly Float64Array[], x: Float64Array, y: Float64Array): Float64Array[] {
  const n = x.length;
  const columns = Array.from({ length: n }, (_, j) =>
    Float64Array.from({ length: n }, (_, i) => bending((x[i]! - x[j]!) ** 2 + (y[i]! - y[j]!) ** 2)),
  );
  for (const column of columns) turn(mirrors, column);
  const rows = Array.from({ length: n }, (_, i) => Float64Array.from(columns, (column) => column[i]!));
  for (const row of rows) turn(mirrors, row);
  return rows;
}

/** The weights off the plane at the smoothing that leaves the gauge's scatter; all zero for a plane. */
function bendingWeights(
  kernel: readonly Float64Array[],
  readings: Float64Array,
  repeatability: number,
  sites: number,
): Float64Array {
  const size = readings.length;
  const flat = new Float64Array(size * size);
  for (let i = 0; i < size; i++) flat.set(kernel[i + 3]!.subarray(3), i * size);
  const left = (column: Float64Array, factor: number) =>
    factor * Math.sqrt(column.reduce((sum, value) => sum + value * value, 0) / sites);
  const flatLeft = left(readings, 1);
  const none = new Float64Array(size);
  if (flatLeft <= repeatability || flatLeft === 0) return none;
  const solved = (lambda: number) => positiveSolve(flat, lambda, readings) ?? none;
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
