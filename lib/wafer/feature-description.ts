import { edgeDistanceMm } from './edge-distance-mm';
import type { PlanGeometry } from './plan-geometry';

/** A probe this many pin spacings from an edge reads high by geometry alone (common practice, no source). */
const EDGE_SPACINGS = 4;

/** Where on the wafer a group of sites lies, in words: "at +x", "at -x, +y", "near the centre". */
export function placeInWords(sites: readonly number[], geometry: PlanGeometry): string {
  const xMm = sites.reduce((sum, i) => sum + geometry.sites[i]!.xMm, 0) / sites.length;
  const yMm = sites.reduce((sum, i) => sum + geometry.sites[i]!.yMm, 0) / sites.length;
  if (Math.hypot(xMm, yMm) < 0.25 * geometry.unitRadiusMm) {
    const wide = sites.some(
      (i) => Math.hypot(geometry.sites[i]!.xMm, geometry.sites[i]!.yMm) > 0.5 * geometry.unitRadiusMm,
    );
    return wide ? 'around the wafer' : 'near the centre';
  }
  const steep = 0.4142 * Math.max(Math.abs(xMm), Math.abs(yMm));
  const parts: string[] = [];
  if (Math.abs(xMm) > steep) parts.push(xMm > 0 ? '+x' : '-x');
  if (Math.abs(yMm) > steep) parts.push(yMm > 0 ? '+y' : '-y');
  return `at ${parts.join(', ')}`;
}

function inWords(percent: number): string {
  return percent < 1000 ? `${percent.toFixed(1)} %` : 'over 1000 %';
}

/**
 * Says what a group of neighbouring sites does, for a person: how many, where, how far from the
 * smooth surface of the rest. Where one of them lies within four probe spacings of the rim or flat,
 * the reading may be the edge and not the wafer, and the words say so; without a diameter that
 * cannot be ruled out for the outermost sites either.
 */
export function featureDescription(
  sites: readonly number[],
  deviationPercent: readonly number[],
  geometry: PlanGeometry,
): string {
  const sizes = deviationPercent.map(Math.abs);
  const least = inWords(Math.min(...sizes));
  const most = inWords(Math.max(...sizes));
  const span = least === most ? most : `${least.replace(' %', '')} to ${most}`;
  const side = (deviationPercent[0] ?? 0) < 0 ? 'below' : 'above';
  const words = `${sites.length} neighbouring sites ${placeInWords(sites, geometry)} read ${span} ${side} the surface of the rest`;
  const isNearEdge = sites.some((i) => {
    const site = geometry.sites[i]!;
    const edgeMm = edgeDistanceMm(site, geometry.diameterMm);
    const fromOutermostMm = geometry.unitRadiusMm - Math.hypot(site.xMm, site.yMm);
    return (edgeMm ?? fromOutermostMm) <= EDGE_SPACINGS * geometry.probeSpacingMm;
  });
  return isNearEdge ? `${words}; edge geometry not excluded` : words;
}
