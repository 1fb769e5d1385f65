import type { BadReason } from '@/lib/wafer/measure-wafer';
import type { WaferRecord } from './wafer-record';

/** Bad sites told in one line: impossible ones of one kind together, those a person may put back each alone. */
export interface BadSiteGroup {
  reason: BadReason;
  siteIndices: number[];
}

const POSSIBLE: readonly BadReason[] = ['outlier', 'by-hand'];

/** The bad sites of a wafer in as few lines as they can be told in; what a person may decide about comes first. */
export function badSiteGroups(badSites: WaferRecord['badSites']): BadSiteGroup[] {
  const single: BadSiteGroup[] = [];
  const together = new Map<BadReason, number[]>();
  for (const { siteIndex, reason } of badSites) {
    if (POSSIBLE.includes(reason)) single.push({ reason, siteIndices: [siteIndex] });
    else together.set(reason, [...(together.get(reason) ?? []), siteIndex]);
  }
  return [...single, ...Array.from(together, ([reason, siteIndices]) => ({ reason, siteIndices }))];
}
