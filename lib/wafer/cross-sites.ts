import type { Site } from './site';

/**
 * A cross on the x and y axes: the centre and four sites at half of `outerRadiusMm` (five sites),
 * or those and four more at `outerRadiusMm` itself (nine sites). It is the quick check of a tool;
 * it cannot see what lies between its arms. Throws a RangeError for any other count or a radius
 * that is not positive.
 *
 * @example crossSites(5, 90) // centre, and four sites 45 mm out
 */
export function crossSites(count: 5 | 9, outerRadiusMm: number): Site[] {
  if (count !== 5 && count !== 9) throw new RangeError(`a cross has 5 or 9 sites: ${String(count)}`);
  if (!(outerRadiusMm > 0) || !Number.isFinite(outerRadiusMm)) {
    throw new RangeError(`outerRadiusMm must be positive: ${outerRadiusMm}`);
  }
  const arms = count === 5 ? [outerRadiusMm / 2] : [outerRadiusMm / 2, outerRadiusMm];
  const sites: Site[] = [{ xMm: 0, yMm: 0 }];
  for (const armMm of arms) {
    sites.push(
      { xMm: armMm, yMm: 0 },
      { xMm: 0, yMm: armMm },
      { xMm: -armMm, yMm: 0 },
      { xMm: 0, yMm: -armMm },
    );
  }
  return sites;
}
