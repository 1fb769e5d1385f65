import type { Site } from './site';

/** Lengths of the primary flat by wafer diameter, mm (SEMI M1, from memory). Larger wafers carry a notch. */
const FLAT_LENGTH_MM: ReadonlyMap<number, number> = new Map([
  [100, 32.5],
  [125, 42.5],
  [150, 57.5],
]);

/**
 * How far a site is from the nearest edge of its wafer, in mm: the rim, or the primary flat at -y on
 * wafers of 100, 125 and 150 mm. Negative beyond the flat. Null without a diameter.
 *
 * @example edgeDistanceMm({ xMm: 95, yMm: 0 }, 200) // 5
 */
export function edgeDistanceMm(site: Site, diameterMm: number | null): number | null {
  if (diameterMm === null) return null;
  if (!(diameterMm > 0)) throw new RangeError(`diameterMm must be positive: ${diameterMm}`);
  const radiusMm = diameterMm / 2;
  const rimMm = radiusMm - Math.hypot(site.xMm, site.yMm);
  const flatLengthMm = FLAT_LENGTH_MM.get(diameterMm);
  if (flatLengthMm === undefined) return rimMm;
  const flatAtMm = Math.sqrt(radiusMm * radiusMm - (flatLengthMm / 2) ** 2);
  return Math.min(rimMm, site.yMm + flatAtMm);
}
