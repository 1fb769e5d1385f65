import { positiveInverse } from './positive-inverse';
import type { Site } from './site';
import type { SurfaceFit } from './surface-fit';

/** Groups of neighbouring sites that may deviate together, made ready to be left out of a fit. */
export interface SitePatches {
  /** The sites of each patch, by their place in the fit. */
  members: Int32Array[];
  /**
   * (I - H)⁻¹ of each patch's sites, H the fit's hat matrix: the lower triangles row by row, one patch after the
   * other, all but the diagonal doubled.
   */
  deletions: Float64Array;
}

/** A feature hardly ever has more sites than the last, and C-steps find what a patch leaves out. */
const PATCH_SITES = [3, 6, 9, 13];
/** How much farther a step across the rings counts than one along them, for patches along the rim. */
const ALONG_RINGS = 8;
const MOST_SHARE = 0.3;
const SLACK = 1 + 1e-6;

/**
 * The patches of a plan: about each site its nearest 3, 6 and 9, all round and along its ring; sites equally far
 * come together, so that turning the wafer changes nothing. None has more than 30 % of the sites.
 */
export function sitePatches(sites: readonly Site[], fit: SurfaceFit): SitePatches {
  const found = new Map<string, Int32Array>();
  const radii = sites.map(({ xMm, yMm }) => Math.hypot(xMm, yMm));
  sites.forEach((centre, c) => {
    for (const across of [0, ALONG_RINGS]) {
      const farMm = sites.map(({ xMm, yMm }, i) =>
        Math.hypot(xMm - centre.xMm, yMm - centre.yMm, across * (radii[i]! - radii[c]!)),
      );
      const inOrder = farMm.slice().sort((a, b) => a - b);
      for (const count of PATCH_SITES) {
        const reachMm = (inOrder[count - 1] ?? Infinity) * SLACK;
        const members = Int32Array.from(sites.keys()).filter((i) => farMm[i]! <= reachMm);
        if (members.length <= MOST_SHARE * sites.length) found.set(members.join(), members);
      }
    }
  });
  const members: Int32Array[] = [];
  const deletions: number[] = [];
  for (const patch of found.values()) {
    const deletion = positiveInverse(leftFree(patch, fit), patch.length);
    if (deletion === null) continue;
    members.push(patch);
    for (let a = 0; a < patch.length; a++) {
      for (let b = 0; b <= a; b++) deletions.push((a === b ? 1 : 2) * deletion[a * patch.length + b]!);
    }
  }
  return { members, deletions: Float64Array.from(deletions) };
}

/** I - H of these sites: how much of a change of each reading stays in each residual. */
function leftFree(patch: Int32Array, fit: SurfaceFit): Float64Array {
  const free = new Float64Array(patch.length ** 2);
  patch.forEach((i, a) => {
    patch.forEach((j, b) => {
      let hat = 0;
      for (let k = 0; k < fit.terms.length; k++) hat += fit.columns[k]![i]! * fit.solution[k]![j]!;
      free[a * patch.length + b] = (a === b ? 1 : 0) - hat;
    });
  });
  return free;
}
