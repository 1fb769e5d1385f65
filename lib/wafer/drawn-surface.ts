import { contours } from 'd3-contour';
import { Delaunay } from 'd3-delaunay';
import type { Site } from './site';
import { smoothSurface, type SmoothSurface } from './smooth-surface';
import { surfaceGrid } from './surface-grid';

/** A place on the drawing, [x, y] in mm from the wafer centre. */
export type Place = readonly [number, number];

/** A surface made ready to be drawn. Nothing is known outside `hull`: draw the regions clipped to it. */
export interface DrawnSurface {
  /** The corners of the sites' convex hull, in order. */
  hull: Place[];
  /** For each level, ascending, the closed rings around the places where the surface is at or above it. */
  regions: { level: number; rings: Place[][] }[];
  /** The surface at a place; null outside the hull. */
  valueAt(xMm: number, yMm: number): number | null;
}

/** Straight between their nodes, so many cells are some hundredths of a gauge's repeatability off the surface. */
const CELLS = 40;

/** Whether a place lies in a convex polygon, its border included. */
export function isInside(hull: readonly Place[], x: number, y: number): boolean {
  let side = 0;
  for (let i = 0; i < hull.length; i++) {
    const [ax, ay] = hull[i]!;
    const [bx, by] = hull[(i + 1) % hull.length]!;
    const turn = (bx - ax) * (y - ay) - (by - ay) * (x - ax);
    if (Math.abs(turn) < 1e-9) continue;
    if (side === 0) side = Math.sign(turn);
    else if (Math.sign(turn) !== side) return false;
  }
  return true;
}

/**
 * The surface of one wafer's good readings for a map: a thin-plate spline smoothed no more than the
 * gauge's repeatability asks (`smoothSurface`), with the regions at or above each of `levels` by
 * marching squares. Values between sites are drawn, none beyond them: the surface ends at the
 * sites' hull. `repeatability` is one standard deviation, in the unit of the readings; `cells` is the number of grid
 * cells across the hull, for drawings so small that fewer will do.
 *
 * Null where the sites span no area. Throws a RangeError as `smoothSurface` does.
 */
export function drawnSurface(
  sites: readonly Site[],
  readings: readonly number[],
  options: { repeatability: number; levels: readonly number[]; cells?: number },
): DrawnSurface | null {
  const surface = smoothSurface(sites, readings, options.repeatability);
  if (surface === null) return null;
  const { hull: corners } = Delaunay.from(
    sites,
    (s) => s.xMm,
    (s) => s.yMm,
  );
  const hull = Array.from(corners, (i): Place => [sites[i]!.xMm, sites[i]!.yMm]);
  return {
    hull,
    regions: regionsAbove(surface, options.levels, options.cells ?? CELLS),
    valueAt: (xMm, yMm) => (isInside(hull, xMm, yMm) ? surface(xMm, yMm) : null),
  };
}

function regionsAbove(surface: SmoothSurface, levels: readonly number[], cells: number) {
  const { columns, rows, values, place } = surfaceGrid(surface, cells);
  const grid = Array.from(values);
  const trace = contours().size([columns, rows]);
  return [...levels]
    .sort((a, b) => a - b)
    .map((level) => ({
      level,
      rings: trace
        .contour(grid, level)
        .coordinates.flat()
        .map((ring) => ring.map(([column = 0, row = 0]) => place(column - 0.5, row - 0.5))),
    }));
}
