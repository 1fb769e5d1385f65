import type { SitePlan } from '@/lib/streams/types';
import { planGeometry, type PlanGeometry } from '@/lib/wafer/plan-geometry';

const MOST_PLANS = 64;

const known = new Map<string, PlanGeometry>();

/** The geometry of a site plan, made once for all streams whose plans hold the same sites: some 20 ms of work. */
export function sharedGeometry({
  diameterMm,
  edgeExclusionMm,
  sites,
}: Pick<SitePlan, 'diameterMm' | 'edgeExclusionMm' | 'sites'>): PlanGeometry {
  const key = JSON.stringify([diameterMm, edgeExclusionMm, sites]);
  const geometry = known.get(key) ?? planGeometry(sites, { diameterMm, edgeExclusionMm });
  known.delete(key);
  known.set(key, geometry);
  const [oldest] = known.keys();
  if (known.size > MOST_PLANS && oldest !== undefined) known.delete(oldest);
  return geometry;
}
