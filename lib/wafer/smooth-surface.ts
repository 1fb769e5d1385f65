import { EigenvalueDecomposition, Matrix, QrDecomposition } from 'ml-matrix';
import type { Site } from './site';

/** A smooth surface through the readings of one wafer: its value at any place, in mm from the centre. */
export type SmoothSurface = (xMm: number, yMm: number) => number;

/** r²·ln r of the squared distance: the bending of a thin plate held at one point. */
function bending(squared: number): number {
  return squared > 0 ? 0.5 * squared * Math.log(squared) : 0;
}

/**
 * The thin-plate smoothing spline of the readings (Duchon 1977; Wahba, Spline Models for
 * Observational Data (1990), from memory), as stiff as the gauge allows and no stiffer: the root mean
 * square of what it leaves of the readings equals `repeatability`, in the unit of the readings
 * (Reinsch, Numer. Math. 10, 177 (1967), from memory). 0 goes through every reading. Where a plane
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
  const scaleMm = Math.max(...sites.map((s) => Math.hypot(s.xMm, s.yMm)), 0) || 1;
  const places = sites.map((s) => [s.xMm / scaleMm, s.yMm / scaleMm] as const);
  if (n < 3) return null;
  const plane = new Matrix(places.map(([x, y]) => [1, x, y]));
  const qr = new QrDecomposition(plane);
  const triangle = qr.upperTriangularMatrix;
  if ([0, 1, 2].some((k) => Math.abs(triangle.get(k, k)) < 1e-6)) return null;

  const onPlane = qr.orthogonalMatrix;
  const free = freeDirections(onPlane, n);
  const kernel = new Matrix(
    places.map(([ax, ay]) => places.map(([bx, by]) => bending((ax - bx) ** 2 + (ay - by) ** 2))),
  );
  const y = Matrix.columnVector([...readings]);
  let weights = Matrix.zeros(n, 1);
  if (free !== null) {
    const { realEigenvalues: stiffness, eigenvectorMatrix: modes } = new EigenvalueDecomposition(
      free.transpose().mmul(kernel).mmul(free),
      { assumeSymmetric: true },
    );
    const amplitudes = modes.transpose().mmul(free.transpose().mmul(y)).to1DArray();
    const left = (lambda: number) =>
      Math.sqrt(
        amplitudes.reduce(
          (sum, a, k) => sum + ((a * lambda) / (Math.max(stiffness[k]!, 0) + lambda)) ** 2,
          0,
        ) / n,
      );
    const lambda = smoothing(
      left,
      repeatability,
      Math.sqrt(amplitudes.reduce((sum, a) => sum + a * a, 0) / n),
    );
    if (lambda !== null) {
      const solved = amplitudes.map((a, k) => a / (Math.max(stiffness[k]!, 0) + lambda));
      weights = free.mmul(modes).mmul(Matrix.columnVector(solved));
    }
  }
  const rest = y.clone().sub(kernel.mmul(weights));
  const offset = qr.solve(rest.sub(fitLeft(rest, onPlane))).to1DArray();
  const w = weights.to1DArray();
  return (xMm, yMm) => {
    const x = xMm / scaleMm;
    const v = yMm / scaleMm;
    let value = offset[0]! + offset[1]! * x + offset[2]! * v;
    for (let i = 0; i < n; i++) {
      const [px, py] = places[i]!;
      value += w[i]! * bending((x - px) ** 2 + (v - py) ** 2);
    }
    return value;
  };
}

/** What of a column lies off the plane. */
function fitLeft(column: Matrix, onPlane: Matrix): Matrix {
  return column.clone().sub(onPlane.mmul(onPlane.transpose().mmul(column)));
}

/** Orthonormal directions of the readings that no plane can follow; null where three sites leave none. */
function freeDirections(onPlane: Matrix, n: number): Matrix | null {
  if (n === 3) return null;
  const columns: number[][] = onPlane.transpose().to2DArray();
  for (let axis = 0; axis < n && columns.length < n; axis++) {
    const column = new Array<number>(n).fill(0);
    column[axis] = 1;
    for (let pass = 0; pass < 2; pass++) {
      for (const known of columns) {
        let along = 0;
        for (let i = 0; i < n; i++) along += known[i]! * column[i]!;
        for (let i = 0; i < n; i++) column[i]! -= along * known[i]!;
      }
    }
    const length = Math.hypot(...column);
    if (length > 1e-3 / n) columns.push(column.map((value) => value / length));
  }
  return new Matrix(columns.slice(3)).transpose();
}

/** The smoothing at which the surface leaves `target`; 0 for none, null for a plane. `left` rises with it. */
function smoothing(left: (lambda: number) => number, target: number, mostLeft: number): number | null {
  if (mostLeft <= target || mostLeft === 0) return null;
  if (target === 0) return 1e-12;
  let low = Math.log(1e-12);
  let high = Math.log(1e6);
  if (left(Math.exp(low)) >= target) return Math.exp(low);
  for (let step = 0; step < 60; step++) {
    const middle = (low + high) / 2;
    if (left(Math.exp(middle)) < target) low = middle;
    else high = middle;
  }
  return Math.exp(low);
}
