import type { PlanGeometry } from './plan-geometry';
import type { RobustDeviations } from './robust-deviations';

/** What the smooth surface says of one wafer: readings that stand alone, and places that deviate together. */
export interface ScreenedReadings {
  /** Sites far from the surface and alone in it, the farthest first. */
  lone: number[];
  /** Groups of neighbouring sites that deviate together, the farthest group first. */
  together: number[][];
}

/** A reading is far from here: about one good reading in 10⁸ by chance, were the spread known. */
export const FAR_SCORE = 6;
/** A neighbour deviates with it from here, if it also goes a quarter of the way. */
const WITH_SCORE = 3;
const WITH_SHARE = 0.25;
/**
 * Sorts the far readings of a wafer into those alone and those whose neighbours deviate with them.
 * A probe that slips spoils one reading; what several neighbours agree on is on the wafer (common
 * practice, no source). `indices` names the plan's site of each reading.
 */
export function screenOutliers(
  deviations: RobustDeviations,
  indices: Int32Array,
  geometry: PlanGeometry,
): ScreenedReadings {
  const scoreOf = new Map<number, number>();
  indices.forEach((site, i) => scoreOf.set(site, deviations.score[i]!));
  const far = [...indices]
    .filter((site) => Math.abs(scoreOf.get(site)!) >= FAR_SCORE)
    .sort((a, b) => Math.abs(scoreOf.get(b)!) - Math.abs(scoreOf.get(a)!));
  const goesWith = (neighbour: number, score: number) => {
    const other = (scoreOf.get(neighbour) ?? 0) * Math.sign(score);
    return other >= Math.max(WITH_SCORE, WITH_SHARE * Math.abs(score));
  };
  const lone: number[] = [];
  const together: number[][] = [];
  const taken = new Set<number>();
  for (const peak of far) {
    if (taken.has(peak)) continue;
    const score = scoreOf.get(peak)!;
    const group = new Set([peak]);
    for (const site of group) {
      for (const neighbour of geometry.neighbours[site]!) {
        if (!taken.has(neighbour) && goesWith(neighbour, score)) group.add(neighbour);
      }
    }
    group.forEach((site) => taken.add(site));
    if (group.size > 1) together.push([...group].sort((a, b) => a - b));
    else if (geometry.neighbours[peak]!.some((neighbour) => goesWith(neighbour, score))) {
      const beside = together.find((sites) =>
        sites.some((site) => geometry.neighbours[peak]!.includes(site)),
      );
      beside?.push(peak);
      beside?.sort((a, b) => a - b);
    } else lone.push(peak);
  }
  return { lone, together };
}
