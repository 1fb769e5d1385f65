import type { Site } from './site';

/**
 * A polar site plan: the centre, then rings 1…`rings` equally spaced out to `outerRadiusMm`,
 * with 8k sites on ring k. Every site then stands for about the same area, so the total,
 * 1 + 4·rings·(rings + 1), gives the familiar plans of 9, 25, 49, 81 and 121 sites.
 * Each ring begins on the +x axis and runs counter-clockwise (common practice, no source).
 *
 * `rings` is a whole number, 0 or more; throws a RangeError otherwise, or when the radius is
 * not a positive number.
 *
 * @example polarSites(3, 72).length // 49
 */
export function polarSites(rings: number, outerRadiusMm: number): Site[] {
  if (!Number.isInteger(rings) || rings < 0) throw new RangeError(`rings must be 0, 1, 2…: ${rings}`);
  if (!(outerRadiusMm > 0) || !Number.isFinite(outerRadiusMm)) {
    throw new RangeError(`outerRadiusMm must be positive: ${outerRadiusMm}`);
  }
  const sites: Site[] = [{ xMm: 0, yMm: 0 }];
  for (let ring = 1; ring <= rings; ring++) {
    const radiusMm = (outerRadiusMm * ring) / rings;
    const count = 8 * ring;
    for (let index = 0; index < count; index++) {
      const angle = (2 * Math.PI * index) / count;
      sites.push({ xMm: radiusMm * exactly(Math.cos(angle)), yMm: radiusMm * exactly(Math.sin(angle)) });
    }
  }
  return sites;
}

/** 0 where it should be: the cosine of a right angle is not quite that in a double, and a site on an axis is. */
function exactly(share: number): number {
  return Math.abs(share) < 1e-12 ? 0 : share;
}
