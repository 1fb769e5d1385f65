import { planPart, type PlanPart } from './plan-part';
import type { Site } from './site';
import { siteNeighbours } from './site-neighbours';

/** A site plan, prepared once for the many wafers measured on it. */
export interface PlanGeometry {
  sites: readonly Site[];
  diameterMm: number | null;
  edgeExclusionMm: number;
  probeSpacingMm: number;
  /** Half the diameter less the edge exclusion; null without a diameter. */
  qualityRadiusMm: number | null;
  /** The unit of the shape terms: the quality radius, or that of the outermost site without a diameter. */
  unitRadiusMm: number;
  /** 1 where the site lies beyond the quality radius and is left out. */
  excluded: Uint8Array;
  excludedSites: number;
  /** Sites within 2 % of the radius of the centre, and of the outermost counted site. */
  centreSites: number[];
  outerSites: number[];
  neighbours: number[][];
  /** All counted sites. */
  whole: PlanPart;
  /** The parts of the plan met so far, by the sites that are missing from them. */
  parts: Map<string, PlanPart>;
}

/** 0.0625 inch, the usual spacing of the pins (common practice, no source). */
const USUAL_PROBE_SPACING_MM = 1.588;
const MOST_PARTS = 512;
const SLACK = 1 + 1e-6;

/** The part of a plan that holds exactly these sites, from the ones met before or made now. */
export function partOfPlan(geometry: PlanGeometry, isCounted: Uint8Array): PlanPart {
  const missing: number[] = [];
  for (const i of geometry.whole.indices) if (isCounted[i] === 0) missing.push(i);
  if (missing.length === 0) return geometry.whole;
  const key = missing.join(',');
  const known = geometry.parts.get(key);
  if (known) return known;
  const indices = geometry.whole.indices.filter((i) => isCounted[i] !== 0);
  const part = planPart(geometry, indices);
  if (geometry.parts.size >= MOST_PARTS) geometry.parts.clear();
  geometry.parts.set(key, part);
  return part;
}

/**
 * Prepares a site plan: which sites count, how much area each stands for (Voronoi cells clipped to
 * the quality area; null without a diameter), who is beside whom, which are centre and outermost
 * ring, and the least-squares matrices of the shapes. Make it once for a plan; it serves every
 * wafer measured on it.
 *
 * `edgeExclusionMm` is the ring at the rim that is left out; sites on its border still count.
 * Throws a RangeError where two sites are the same place, a site lies off the wafer or is not a
 * number, or where there is an edge exclusion but no diameter to take it from.
 */
export function planGeometry(
  sites: readonly Site[],
  options: { diameterMm: number | null; edgeExclusionMm: number; probeSpacingMm?: number },
): PlanGeometry {
  const { diameterMm, edgeExclusionMm } = options;
  const probeSpacingMm = options.probeSpacingMm ?? USUAL_PROBE_SPACING_MM;
  const qualityRadiusMm = checkedQualityRadiusMm(diameterMm, edgeExclusionMm, probeSpacingMm);
  checkSites(sites, diameterMm);
  const radii = sites.map((s) => Math.hypot(s.xMm, s.yMm));
  const excluded = Uint8Array.from(radii, (r) =>
    qualityRadiusMm !== null && r > qualityRadiusMm * SLACK ? 1 : 0,
  );
  const indices = Int32Array.from(sites.keys()).filter((i) => excluded[i] === 0);
  const outermostMm = indices.reduce((most, i) => Math.max(most, radii[i]!), 0);
  const unitRadiusMm = qualityRadiusMm ?? (outermostMm > 0 ? outermostMm : 1);
  const counted = Array.from(indices, (i) => sites[i]!);
  const neighbours: number[][] = sites.map(() => []);
  siteNeighbours(counted).forEach((list, i) => {
    neighbours[indices[i]!] = list.map((j) => indices[j]!);
  });
  const centreSites = [...indices].filter((i) => radii[i]! <= 0.02 * unitRadiusMm);
  const ringFromMm = outermostMm - 0.02 * unitRadiusMm;
  return {
    sites,
    diameterMm,
    edgeExclusionMm,
    probeSpacingMm,
    qualityRadiusMm,
    unitRadiusMm,
    excluded,
    excludedSites: sites.length - indices.length,
    centreSites,
    outerSites:
      ringFromMm > 0.02 * unitRadiusMm ? [...indices].filter((i) => radii[i]! >= ringFromMm / SLACK) : [],
    neighbours,
    whole: planPart({ sites, neighbours, unitRadiusMm, qualityRadiusMm }, indices),
    parts: new Map(),
  };
}

function checkedQualityRadiusMm(
  diameterMm: number | null,
  edgeExclusionMm: number,
  probeSpacingMm: number,
): number | null {
  if (!(edgeExclusionMm >= 0) || !Number.isFinite(edgeExclusionMm)) {
    throw new RangeError(`edgeExclusionMm must be 0 or more: ${edgeExclusionMm}`);
  }
  if (!(probeSpacingMm > 0) || !Number.isFinite(probeSpacingMm)) {
    throw new RangeError(`probeSpacingMm must be positive: ${probeSpacingMm}`);
  }
  if (diameterMm === null) {
    if (edgeExclusionMm > 0) throw new RangeError('an edge exclusion needs the wafer diameter');
    return null;
  }
  if (!(diameterMm > 0) || !Number.isFinite(diameterMm)) {
    throw new RangeError(`diameterMm must be positive: ${diameterMm}`);
  }
  const radiusMm = diameterMm / 2 - edgeExclusionMm;
  if (radiusMm <= 0) throw new RangeError(`an edge exclusion of ${edgeExclusionMm} mm leaves nothing`);
  return radiusMm;
}

function checkSites(sites: readonly Site[], diameterMm: number | null): void {
  const places = new Set<string>();
  sites.forEach(({ xMm, yMm }, i) => {
    if (!Number.isFinite(xMm) || !Number.isFinite(yMm)) throw new RangeError(`site ${i + 1} has no place`);
    if (diameterMm !== null && Math.hypot(xMm, yMm) > (diameterMm / 2) * SLACK) {
      throw new RangeError(`site ${i + 1} (${xMm}, ${yMm}) lies off a wafer of ${diameterMm} mm`);
    }
    const place = `${xMm.toFixed(6)},${yMm.toFixed(6)}`;
    if (places.has(place)) throw new RangeError(`site ${i + 1} (${xMm}, ${yMm}) is there twice`);
    places.add(place);
  });
}
