/**
 * A lane for each label above a chart so that none covers another: the first lane with room, null where all are
 * taken (the label is then left to the cursor and the table). Labels begin at their `x`; one that would run over
 * the `right` end is moved left.
 *
 * @example labelLanes([{ x: 0, width: 50 }, { x: 20, width: 50 }], { lanes: 2, right: 100 }).map((l) => l.lane) // [0, 1]
 */
export function labelLanes(
  labels: readonly { x: number; width: number }[],
  room: { lanes: number; right: number },
): { x: number; lane: number | null }[] {
  const taken = Array.from({ length: room.lanes }, () => Number.NEGATIVE_INFINITY);
  const order = labels.map((_, at) => at).sort((a, b) => (labels[a]?.x ?? 0) - (labels[b]?.x ?? 0));
  const placed = labels.map((label) => ({
    x: Math.max(0, Math.min(label.x, room.right - label.width)),
    lane: -1,
  }));
  for (const at of order) {
    const place = placed[at];
    const label = labels[at];
    if (place === undefined || label === undefined) continue;
    place.lane = taken.findIndex((end) => end <= place.x);
    if (place.lane >= 0) taken[place.lane] = place.x + label.width + 8;
  }
  return placed.map(({ x, lane }) => ({ x, lane: lane < 0 ? null : lane }));
}
