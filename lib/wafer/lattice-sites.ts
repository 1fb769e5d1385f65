import type { Site } from './site';

/**
 * A square lattice of any pitch with a site in the centre, cut at the quality circle; rows run from
 * +y down, each from -x to +x. Every site stands for the same area, so the plain mean is close to
 * the area mean. Throws a RangeError when pitch or radius is not positive, or when the lattice
 * would hold more than 10 000 sites.
 *
 * @example latticeSites(10, 10).length // 5
 */
export function latticeSites(pitchMm: number, outerRadiusMm: number): Site[] {
  for (const [name, length] of [
    ['pitchMm', pitchMm],
    ['outerRadiusMm', outerRadiusMm],
  ] as const) {
    if (!(length > 0) || !Number.isFinite(length))
      throw new RangeError(`${name} must be positive: ${length}`);
  }
  if (Math.PI * (outerRadiusMm / pitchMm) ** 2 > 10_000) throw new RangeError('more than 10 000 sites');
  const reach = Math.floor(outerRadiusMm / pitchMm + 1e-9);
  const limitMm = outerRadiusMm * (1 + 1e-9);
  const sites: Site[] = [];
  for (let row = reach; row >= -reach; row--) {
    for (let column = -reach; column <= reach; column++) {
      if (Math.hypot(row, column) * pitchMm <= limitMm) {
        sites.push({ xMm: column * pitchMm, yMm: row * pitchMm });
      }
    }
  }
  return sites;
}
