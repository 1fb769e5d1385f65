/**
 * The revision in force at an instant: the latest that took effect at or before it. A wafer from before the first
 * revision is held against the first.
 */
export function inForce<Revision extends { effectiveFrom: Date; revision: number }>(
  revisions: readonly Revision[],
  at: Date,
): Revision | null {
  let found: Revision | null = null;
  let first: Revision | null = null;
  for (const revision of revisions) {
    if (first === null || revision.revision < first.revision) first = revision;
    if (revision.effectiveFrom > at) continue;
    const later =
      found === null ||
      revision.effectiveFrom > found.effectiveFrom ||
      (revision.effectiveFrom.getTime() === found.effectiveFrom.getTime() &&
        revision.revision > found.revision);
    if (later) found = revision;
  }
  return found ?? first;
}
