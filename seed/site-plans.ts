import { polarSites } from '@/lib/wafer/polar-sites';
import type { DemoStream } from './demo-stream';

/** The parts of a stream that a site plan decides. */
export type PlannedSites = Pick<DemoStream, 'diameterMm' | 'edgeExclusionMm' | 'sites' | 'sitePlanName'>;

/** A polar plan with `rings` rings whose outermost sites lie 2 mm inside the quality area. */
export function polarPlan(diameterMm: number, edgeExclusionMm: number, rings: number): PlannedSites {
  const sites = polarSites(rings, diameterMm / 2 - edgeExclusionMm - 2);
  return { diameterMm, edgeExclusionMm, sites, sitePlanName: `Polar ${sites.length}, ${diameterMm} mm` };
}
