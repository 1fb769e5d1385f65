/**
 * The place of the point whose index lies nearest to `index`, in points ordered by index; the earlier of two that
 * are equally near; null among none.
 *
 * @example nearestPoint([{ index: 3 }, { index: 7 }], 5.5) // 1
 */
export function nearestPoint(points: readonly { index: number }[], index: number): number | null {
  let low = 0;
  let high = points.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((points[middle]?.index ?? index) < index) low = middle + 1;
    else high = middle;
  }
  const after = points[low];
  const before = points[low - 1];
  if (after === undefined) return before === undefined ? null : low - 1;
  if (before === undefined) return low;
  return index - before.index <= after.index - index ? low - 1 : low;
}
