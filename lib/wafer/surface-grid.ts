import type { SmoothSurface } from './smooth-surface';
import { bending, type SplineBasis } from './spline-basis';

/** A square grid over the sites of a surface, a few cells beyond them, and the surface at its nodes, row by row. */
export interface SurfaceGrid {
  columns: number;
  rows: number;
  values: Float64Array;
  /** The place of a node, in mm from the wafer centre; between nodes too. */
  place: (column: number, row: number) => readonly [number, number];
}

/** Grid cells kept around the sites, so that no ring is cut inside them. */
const MARGIN = 2;

/** Where the nodes lie, and the bending about each site at each node: half the digits are plenty for a drawing. */
interface GridBasis extends Omit<SurfaceGrid, 'values'> {
  u: Float64Array;
  v: Float64Array;
  bendings: Float32Array;
}

/** Logarithms by the hundred thousand: kept for as long as the sites they belong to. */
const known = new WeakMap<SplineBasis, Map<number, GridBasis>>();

/** The surface on a grid with so many cells across its sites: after the first of its sites one product a node and site. */
export function surfaceGrid({ plane, weights, basis }: SmoothSurface, cells: number): SurfaceGrid {
  const { columns, rows, place, u, v, bendings } = gridBasis(basis, cells);
  const sites = weights.length;
  const values = new Float64Array(columns * rows);
  for (let node = 0; node < values.length; node++) {
    let value = plane[0]! + plane[1]! * u[node]! + plane[2]! * v[node]!;
    const from = node * sites;
    for (let i = 0; i < sites; i++) value += weights[i]! * bendings[from + i]!;
    values[node] = value;
  }
  return { columns, rows, values, place };
}

function gridBasis(basis: SplineBasis, cells: number): GridBasis {
  const ofSites = known.get(basis) ?? new Map<number, GridBasis>();
  known.set(basis, ofSites);
  const found = ofSites.get(cells);
  if (found !== undefined) return found;
  const made = worked(basis, cells);
  ofSites.set(cells, made);
  return made;
}

function worked({ x, y, scaleMm }: SplineBasis, cells: number): GridBasis {
  const [left, bottom] = [Math.min(...x), Math.min(...y)];
  const [width, height] = [Math.max(...x) - left, Math.max(...y) - bottom];
  const step = Math.max(width, height) / cells;
  const columns = Math.ceil(width / step) + 2 * MARGIN + 1;
  const rows = Math.ceil(height / step) + 2 * MARGIN + 1;
  const nodes = columns * rows;
  const u = Float64Array.from({ length: nodes }, (_, node) => left + ((node % columns) - MARGIN) * step);
  const v = Float64Array.from(
    { length: nodes },
    (_, node) => bottom + (Math.floor(node / columns) - MARGIN) * step,
  );
  const bendings = new Float32Array(nodes * x.length);
  for (let node = 0; node < nodes; node++) {
    const from = node * x.length;
    for (let i = 0; i < x.length; i++)
      bendings[from + i] = bending((u[node]! - x[i]!) ** 2 + (v[node]! - y[i]!) ** 2);
  }
  const place = (column: number, row: number) =>
    [scaleMm * (left + (column - MARGIN) * step), scaleMm * (bottom + (row - MARGIN) * step)] as const;
  return { columns, rows, place, u, v, bendings };
}
