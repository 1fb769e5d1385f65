import { Delaunay } from 'd3-delaunay';
import { polygonDiscArea } from './polygon-disc-area';
import type { Site } from './site';

/**
 * The share of the quality area that each site stands for: its Voronoi cell (all places nearer to
 * it than to any other site), clipped to the disc of `qualityRadiusMm`. The shares add up to 1; the
 * weighted mean of the readings is the area mean. Voronoi, J. reine angew. Math. 134, 198 (1908),
 * from memory; the clipping is exact. No sites give no weights; throws a RangeError when the
 * radius is not positive.
 */
export function areaWeights(sites: readonly Site[], qualityRadiusMm: number): Float64Array {
  if (!(qualityRadiusMm > 0)) throw new RangeError(`qualityRadiusMm must be positive: ${qualityRadiusMm}`);
  const weights = new Float64Array(sites.length);
  if (sites.length === 0) return weights;
  if (sites.length === 1) return weights.fill(1);
  const box = 4 * qualityRadiusMm;
  const voronoi = Delaunay.from(
    sites,
    (s) => s.xMm,
    (s) => s.yMm,
  ).voronoi([-box, -box, box, box]);
  let total = 0;
  for (let i = 0; i < sites.length; i++) {
    const cell = voronoi.cellPolygon(i) as [number, number][] | null;
    const area = cell === null ? 0 : polygonDiscArea(cell.slice(0, -1), qualityRadiusMm);
    weights[i] = area;
    total += area;
  }
  return total > 0 ? weights.map((area) => area / total) : weights.fill(1 / sites.length);
}
