import type { SpanWafer } from '@/lib/excursions/span-wafers';

/**
 * The subgroups that came late: all their wafers were recorded after wafers of a subgroup that was processed after
 * them. History sent in afterwards is not late.
 */
export function lateOnes(
  points: readonly { id: string }[],
  wafersOf: ReadonlyMap<string, readonly Pick<SpanWafer, 'recordedAt' | 'history'>[]>,
): Set<string> {
  const late = new Set<string>();
  let earliestAfter = Number.POSITIVE_INFINITY;
  for (const { id } of points.toReversed()) {
    const wafers = wafersOf.get(id)?.filter((wafer) => !wafer.history) ?? [];
    if (wafers.length === 0) continue;
    const recordedAt = Math.min(...wafers.map((wafer) => wafer.recordedAt));
    if (recordedAt > earliestAfter) late.add(id);
    earliestAfter = Math.min(earliestAfter, recordedAt);
  }
  return late;
}
