import { thinned } from '@/app/_charts/thinned';
import type { SpanPoint } from '@/lib/excursions/span-points';

/** A subgroup that is drawn, with its place among all of the stretch. */
export type DrawnPoint = SpanPoint & { index: number };

/** What a browser draws without delay. */
export const MOST_MARKS = 600;

/**
 * The points to draw of a stretch: all of them, or at most `most`, with every signal, every extreme and the selected
 * one. A signal that goes on for many subgroups is kept where it begins and where it ends.
 */
export function drawnPoints(
  points: readonly SpanPoint[],
  selectedId: string | null,
  most = MOST_MARKS,
): DrawnPoint[] {
  const all = points.map((point, index) => ({ ...point, index }));
  if (all.length <= most) return all;
  const turns = all.map((point, at) => ({ ...point, completions: turning(all, at) }));
  const kept = new Set(thinned(turns, most - 1).map((point) => point.index));
  return all.filter((point) => kept.has(point.index) || point.id === selectedId);
}

/** The patterns of a point that the point before or the point after does not complete as well. */
function turning(points: readonly SpanPoint[], at: number): readonly string[] {
  const { completions } = points[at] as SpanPoint;
  if (completions.length === 0) return completions;
  const before = points[at - 1]?.completions ?? [];
  const after = points[at + 1]?.completions ?? [];
  return completions.filter((one) => !before.includes(one) || !after.includes(one));
}
