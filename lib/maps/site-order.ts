import type { SitePlan } from '@/lib/streams/types';

/** How far a place in a file may lie from a site of the plan and still be that site, mm. */
const SAME_PLACE_MM = 0.1;

/** A fault of one row, by its place among the rows of the map. */
export interface SiteFault {
  row: number;
  column: string;
  reason: string;
}

/**
 * Puts readings into the order of a site plan. A site without a row is null. A row off the wafer, at no site of the
 * plan, or at a site that has a row already, is a fault.
 */
export function inSiteOrder(
  plan: SitePlan,
  rows: {
    xMm: readonly number[];
    yMm: readonly number[];
    values: readonly (number | null)[];
    lines: readonly number[];
  },
): { readings: (number | null)[]; faults: SiteFault[] } {
  const isPlanOrder =
    rows.values.length === plan.sites.length &&
    rows.values.every((_, row) => isAt(plan, row, rows.xMm[row] as number, rows.yMm[row] as number));
  if (isPlanOrder) return { readings: rows.values.slice(), faults: [] };
  const readings = new Array<number | null>(plan.sites.length).fill(null);
  const rowOf = new Int32Array(plan.sites.length).fill(-1);
  const faults: SiteFault[] = [];
  for (let row = 0; row < rows.values.length; row += 1) {
    const x = rows.xMm[row] as number;
    const y = rows.yMm[row] as number;
    const site = isAt(plan, row, x, y) ? row : plan.sites.findIndex((_, index) => isAt(plan, index, x, y));
    if (site === -1) {
      const off = Math.hypot(x, y) > plan.diameterMm / 2;
      const place = `(${x}, ${y}) mm`;
      const reason = off
        ? `${place} lies outside a wafer of ${plan.diameterMm} mm`
        : `${place} is no site of the plan "${plan.name}"`;
      faults.push({ row, column: 'x_mm', reason });
    } else if (rowOf[site] !== -1) {
      const first = rows.lines[rowOf[site] as number];
      faults.push({ row, column: 'x_mm', reason: `this site has a reading already, on line ${first}` });
    } else {
      rowOf[site] = row;
      readings[site] = rows.values[row] as number | null;
    }
  }
  return { readings, faults };
}

function isAt(plan: SitePlan, index: number, xMm: number, yMm: number): boolean {
  const site = plan.sites[index];
  return (
    site !== undefined &&
    Math.abs(site.xMm - xMm) <= SAME_PLACE_MM &&
    Math.abs(site.yMm - yMm) <= SAME_PLACE_MM
  );
}
