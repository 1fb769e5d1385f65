import { areaWeights } from './area-weights';
import { SCREEN_TERMS, SHAPE_TERMS } from './disc-terms';
import type { Site } from './site';
import { sitePatches, type SitePatches } from './site-patches';
import { surfaceFit, type SurfaceFit } from './surface-fit';

/** What belongs to one set of counted sites of a plan: usually all of them, fewer when some are bad. */
export interface PlanPart {
  /** Site numbers in the plan, ascending. */
  indices: Int32Array;
  /** Share of the quality area per counted site; null without a diameter. */
  weights: Float64Array | null;
  shapeFit: SurfaceFit;
  /** The surface that readings are screened against, and the most flexible one the sites allow. */
  screenFit: SurfaceFit;
  flexibleFit: SurfaceFit;
  /** Neighbouring sites two by two, and groups of them to try without, by place in `indices`. */
  pairs: Int32Array;
  patches: SitePatches;
}

/**
 * The surface for screening is stiffer than the one for shape: with a term for every third site it
 * bends through three neighbours at the rim that deviate together, and blames the ones beside them.
 * On few sites it has the shapes of the second order all the same: a saddle is on most wafers.
 */
const sitesPerScreenTerm = (sites: number) => (sites < 36 ? 4 : 6);

/** Lets a figure be worked out when it is first asked for, and kept. */
function once<T>(make: () => T): () => T {
  let kept: { value: T } | null = null;
  return () => (kept ??= { value: make() }).value;
}

/** Prepares these sites of a plan; each of its figures is worked out when it is first asked for. */
export function planPart(
  plan: {
    sites: readonly Site[];
    neighbours: readonly (readonly number[])[];
    unitRadiusMm: number;
    qualityRadiusMm: number | null;
  },
  indices: Int32Array,
): PlanPart {
  const { unitRadiusMm, qualityRadiusMm } = plan;
  const counted = Array.from(indices, (i) => plan.sites[i]!);
  const weights = once(() => (qualityRadiusMm === null ? null : areaWeights(counted, qualityRadiusMm)));
  const shapeFit = once(() => surfaceFit(counted, unitRadiusMm, SHAPE_TERMS));
  const screenFit = once(() =>
    surfaceFit(counted, unitRadiusMm, SCREEN_TERMS, sitesPerScreenTerm(counted.length)),
  );
  const flexibleFit = once(() => surfaceFit(counted, unitRadiusMm, SCREEN_TERMS));
  const pairs = once(() => neighbourPairs(plan.neighbours, indices));
  const patches = once(() => sitePatches(counted, screenFit()));
  return {
    indices,
    get weights() {
      return weights();
    },
    get shapeFit() {
      return shapeFit();
    },
    get screenFit() {
      return screenFit();
    },
    get flexibleFit() {
      return flexibleFit();
    },
    get pairs() {
      return pairs();
    },
    get patches() {
      return patches();
    },
  };
}

function neighbourPairs(neighbours: readonly (readonly number[])[], indices: Int32Array): Int32Array {
  const placeOf = new Map(Array.from(indices, (site, place) => [site, place]));
  const pairs: number[] = [];
  indices.forEach((site, place) => {
    for (const neighbour of neighbours[site]!) {
      const other = placeOf.get(neighbour);
      if (other !== undefined && other > place) pairs.push(place, other);
    }
  });
  return Int32Array.from(pairs);
}
