/** What thinning looks at: four series, and whether a point is a signal. */
export interface ThinnablePoint {
  level: number | null;
  movingRange: number | null;
  within: number | null;
  between: number | null;
  completions: readonly string[];
  outOfSpecification: boolean;
}

const series = ['level', 'movingRange', 'within', 'between'] as const;

/**
 * At most `most` of the points, in their order, so that a long stream stays quick to draw and honest to look at.
 *
 * Always kept, even beyond `most`: every signal, everything out of specification, the first and last point, the
 * lowest and highest of each series, and one point of each gap, so that gaps stay gaps. What room is left is shared
 * out evenly: of each stretch of the stream its lowest and highest level. Nothing is averaged: every point drawn
 * was measured.
 *
 * @throws RangeError unless `most` is a whole number from 2 up.
 * @example thinned(points, 600).length // 600 or fewer, unless more than that are signals
 */
export function thinned<Point extends ThinnablePoint>(points: readonly Point[], most: number): Point[] {
  if (!Number.isInteger(most) || most < 2)
    throw new RangeError('At least two points are needed to draw a line');
  if (points.length <= most) return [...points];

  const kept = new Set<number>([0, points.length - 1]);
  points.forEach((point, at) => {
    const beginsGap = point.level === null && (points[at - 1]?.level ?? null) !== null;
    if (point.completions.length > 0 || point.outOfSpecification || beginsGap) kept.add(at);
  });
  for (const name of series) for (const at of extremes(points, name, 0, points.length)) kept.add(at);

  const stretches = Math.floor((most - kept.size) / 2);
  for (let part = 0; part < stretches; part++) {
    const from = Math.floor((part * points.length) / stretches);
    const to = Math.floor(((part + 1) * points.length) / stretches);
    for (const at of extremes(points, 'level', from, to)) kept.add(at);
  }
  return points.filter((_, at) => kept.has(at));
}

/** Places of the lowest and the highest value among points `from` to `to` (not included); none where all are null. */
function extremes(
  points: readonly ThinnablePoint[],
  name: (typeof series)[number],
  from: number,
  to: number,
) {
  let lowest = -1;
  let highest = -1;
  for (let at = from; at < to; at++) {
    const value = points[at]?.[name] ?? null;
    if (value === null) continue;
    if (lowest < 0 || value < (points[lowest]?.[name] ?? value)) lowest = at;
    if (highest < 0 || value > (points[highest]?.[name] ?? value)) highest = at;
  }
  return lowest < 0 ? [] : [lowest, highest];
}
