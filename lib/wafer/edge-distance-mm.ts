import { flatOffsetMm } from './flat-offset-mm';
import type { Site } from './site';

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
  const flatAtMm = flatOffsetMm(diameterMm);
  if (flatAtMm === null) return rimMm;
  return Math.min(rimMm, site.yMm + flatAtMm);
}
