import type { Site } from './site';

/**
 * A diameter scan: `count` equally spaced sites on a line through the centre, from one rim of the
 * quality area to the other. At least 25 sites, or the steep rim falls between two of them (common
 * practice, no source). `angleDegrees` turns the line counter-clockwise from the x axis. An odd
 * count puts a site in the centre. Throws a RangeError on fewer sites or a radius that is not positive.
 *
 * @example scanSites(25, 97)[12] // the centre
 */
export function scanSites(count: number, outerRadiusMm: number, angleDegrees = 0): Site[] {
  if (!Number.isInteger(count) || count < 25) throw new RangeError(`a scan has 25 sites or more: ${count}`);
  if (!(outerRadiusMm > 0) || !Number.isFinite(outerRadiusMm)) {
    throw new RangeError(`outerRadiusMm must be positive: ${outerRadiusMm}`);
  }
  if (!Number.isFinite(angleDegrees)) throw new RangeError(`angleDegrees must be finite: ${angleDegrees}`);
  const angle = (angleDegrees * Math.PI) / 180;
  return Array.from({ length: count }, (_, index) => {
    const alongMm = (outerRadiusMm * (2 * index - (count - 1))) / (count - 1);
    return { xMm: alongMm * Math.cos(angle), yMm: alongMm * Math.sin(angle) };
  });
}
