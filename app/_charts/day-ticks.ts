/**
 * Where the horizontal axis is labelled: at points where a new day begins, at most `most` of them, evenly chosen;
 * where all points share a day, the first alone.
 *
 * @example dayTicks([{ index: 0, day: '1 Nov' }, { index: 1, day: '1 Nov' }, { index: 2, day: '2 Nov' }], 6)
 * // [{ index: 0, day: '1 Nov' }, { index: 2, day: '2 Nov' }]
 */
export function dayTicks(
  points: readonly { index: number; day: string }[],
  most: number,
): { index: number; day: string }[] {
  const begins = points.filter((point, at) => points[at - 1]?.day !== point.day);
  const every = Math.max(1, Math.ceil(begins.length / Math.max(1, most)));
  return begins.filter((_, at) => at % every === 0).map(({ index, day }) => ({ index, day }));
}
