import { discPositionFactor } from './disc-position-factor';
import type { Place } from './disc-transfer-resistance';
import { spacingFactor } from './spacing-factor';
import { thicknessFactor } from './thickness-factor';

/** A probe with four pins in line and the wafer under it. */
export interface ProbeGeometry {
  /** Mean of the three spacings. */
  spacingMm: number;
  /** Between the two inner pins; null where they stand evenly. */
  innerSpacingMm: number | null;
  /** Direction of the pins against +x; null: along the radius of each site. */
  angleRadians: number | null;
  /** Of the conducting disc. */
  diameterMm: number;
  /** Of the conducting part; a layer thin against the spacing may be left null. */
  thicknessUm: number | null;
}

/**
 * What V/I must be multiplied by at each site to be a sheet resistance in Ω/□: the image solution of the disc, times the
 * corrections for uneven pins and for a thickness that counts against the spacing (ASTM F84 / SEMI MF84: the product of
 * the corrections, each small where another is large).
 *
 * Null for a site at which a pin would stand off the disc. Throws RangeError for a geometry that cannot be.
 *
 * @example siteFactors([{ xMm: 0, yMm: 0 }], { spacingMm: 1, innerSpacingMm: null, angleRadians: 0, diameterMm: 200, thicknessUm: null })[0] // 4.5320
 */
export function siteFactors(sites: readonly Place[], geometry: ProbeGeometry): (number | null)[] {
  const { spacingMm, innerSpacingMm, angleRadians, diameterMm, thicknessUm } = geometry;
  if (!(spacingMm > 0 && diameterMm >= 3 * spacingMm && Number.isFinite(diameterMm))) {
    throw new RangeError(`Four pins ${spacingMm} mm apart do not fit on a disc of ${diameterMm} mm.`);
  }
  const common =
    (innerSpacingMm === null ? 1 : spacingFactor(innerSpacingMm, spacingMm)) *
    (thicknessUm === null ? 1 : thicknessFactor(thicknessUm / 1000 / spacingMm));
  const radiusMm = diameterMm / 2;
  return sites.map((site) => {
    const angle = angleRadians ?? Math.atan2(site.yMm, site.xMm);
    const [dx, dy] = [1.5 * spacingMm * Math.cos(angle), 1.5 * spacingMm * Math.sin(angle)];
    const farthest = Math.max(
      Math.hypot(site.xMm + dx, site.yMm + dy),
      Math.hypot(site.xMm - dx, site.yMm - dy),
    );
    return farthest < radiusMm ? common * discPositionFactor(site, angle, spacingMm, radiusMm) : null;
  });
}
