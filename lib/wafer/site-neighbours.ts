import { Delaunay } from 'd3-delaunay';
import type { Site } from './site';

/** A neighbour may lie this many times as far as the nearest site; farther ones only share a long hull edge. */
const REACH = 2.2;

/**
 * Which sites lie beside which: those joined in the Delaunay triangulation, less the long joins
 * along the rim of an uneven plan. Two sites are neighbours of each other or not at all.
 */
export function siteNeighbours(sites: readonly Site[]): number[][] {
  const neighbours: number[][] = sites.map(() => []);
  if (sites.length < 2) return neighbours;
  const triangulation = Delaunay.from(
    sites,
    (s) => s.xMm,
    (s) => s.yMm,
  );
  const distance = (i: number, j: number) =>
    Math.hypot(sites[i]!.xMm - sites[j]!.xMm, sites[i]!.yMm - sites[j]!.yMm);
  const joined = sites.map((_, i) => [...triangulation.neighbors(i)]);
  const nearest = joined.map((list, i) => Math.min(...list.map((j) => distance(i, j))));
  joined.forEach((list, i) => {
    for (const j of list) {
      const reachMm = REACH * Math.max(nearest[i]!, nearest[j]!);
      if (distance(i, j) <= reachMm) neighbours[i]!.push(j);
    }
  });
  return neighbours;
}
