import { mirrorOf, turned } from './mirror';
import type { Site } from './site';
import { tridiagonalised } from './tridiagonalised';

/**
 * What a thin-plate spline through given sites owes to the sites alone, made ready so that a wafer costs a few turns of
 * its readings. Seen along axes turned by `mirrors`, the first three of which span the planes, the bending between the
 * sites is tridiagonal.
 */
export interface SplineBasis {
  /** Places over `scaleMm`, so that the outermost is about 1. */
  scaleMm: number;
  x: Float64Array;
  y: Float64Array;
  mirrors: readonly Float64Array[];
  /** The plane's columns 1, x, y as an upper triangle: `plane[column][row]`. */
  plane: readonly Float64Array[];
  /** The bending between the plane's axes and the others: three rows. */
  across: readonly Float64Array[];
  diagonal: Float64Array;
  beside: Float64Array;
}

/** r²·ln r of the squared distance: the bending of a thin plate held at one point. */
export function bending(squared: number): number {
  return squared > 0 ? 0.5 * squared * Math.log(squared) : 0;
}

/** A plan has few sets of good sites: each is worked out once, and what is made of it goes with it. */
const known = new Map<string, SplineBasis | null>();
const MOST_KNOWN = 24;

/** Null where the sites do not span a surface: fewer than three, or all on one line. */
export function splineBasis(sites: readonly Site[]): SplineBasis | null {
  const key = sites.map(({ xMm, yMm }) => `${xMm} ${yMm}`).join();
  const found = known.get(key);
  if (found !== undefined) return found;
  const basis = worked(sites);
  if (known.size >= MOST_KNOWN) known.clear();
  known.set(key, basis);
  return basis;
}

function worked(sites: readonly Site[]): SplineBasis | null {
  const n = sites.length;
  if (n < 3) return null;
  const scaleMm = Math.max(...sites.map((s) => Math.hypot(s.xMm, s.yMm))) || 1;
  const x = Float64Array.from(sites, (s) => s.xMm / scaleMm);
  const y = Float64Array.from(sites, (s) => s.yMm / scaleMm);
  const plane = [new Float64Array(n).fill(1), x.slice(), y.slice()];
  const flat = triangularised(plane);
  if (flat === null) return null;
  const columns = Array.from({ length: n }, (_, j) =>
    Float64Array.from({ length: n }, (_, i) => bending((x[i]! - x[j]!) ** 2 + (y[i]! - y[j]!) ** 2)),
  );
  for (const column of columns) turned(flat, column);
  const rows = Array.from({ length: n }, (_, i) => Float64Array.from(columns, (column) => column[i]!));
  for (const row of rows) turned(flat, row);
  const across = rows.slice(0, 3).map((row) => row.slice(3));
  const bent = rows.slice(3).map((row) => row.slice(3));
  const bends = tridiagonalised(bent);
  for (const row of across) turned(bends, row);
  return {
    scaleMm,
    x,
    y,
    mirrors: [...flat, ...bends],
    plane,
    across,
    diagonal: Float64Array.from(bent, (row, i) => row[i]!),
    beside: Float64Array.from({ length: Math.max(0, n - 4) }, (_, i) => bent[i]![i + 1]!),
  };
}

/** Turns three columns into an upper triangle, in place; the mirrors that do it, or null where they are not independent. */
function triangularised(columns: readonly Float64Array[]): Float64Array[] | null {
  const mirrors: Float64Array[] = [];
  for (let k = 0; k < columns.length; k++) {
    const mirror = mirrorOf(columns[k]!.slice(k), 1e-6);
    if (mirror === null) return null;
    for (const other of columns.slice(k)) turned([mirror], other);
    mirrors.push(mirror);
  }
  return mirrors;
}
