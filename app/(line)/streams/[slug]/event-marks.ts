import type { LimitSpan, StreamEvent as EventMark } from '@/app/_charts/stream-chart-point';
import type { StreamEvent } from '@/lib/streams/types';

const LONGEST = 48;

/**
 * What happened along a stretch, each half a step before the first point that came after it: adjustments and
 * maintenance, and where other limits took over.
 */
export function eventMarks(
  points: readonly { at: number }[],
  events: readonly StreamEvent[],
  limits: readonly Pick<LimitSpan, 'fromIndex' | 'revision' | 'state'>[],
): EventMark[] {
  const marks: EventMark[] = events.map(({ kind, at, restart, text }) => ({
    kind,
    index: firstAfter(points, at.getTime()) - 0.5,
    text: `${shortened(text)}${restart ? ' Rules start afresh.' : ''}`,
  }));
  const taken = limits
    .filter(({ fromIndex }) => fromIndex > 0)
    .map(({ fromIndex, revision, state }) => ({
      kind: 'limits' as const,
      index: fromIndex - 0.5,
      text: `limits ${revision}${state === 'provisional' ? ', provisional' : ''}`,
    }));
  return [...marks, ...taken].sort((a, b) => a.index - b.index);
}

function firstAfter(points: readonly { at: number }[], at: number): number {
  let [low, high] = [0, points.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((points[middle]?.at ?? 0) > at) high = middle;
    else low = middle + 1;
  }
  return low;
}

function shortened(text: string): string {
  return text.length <= LONGEST ? text : `${text.slice(0, LONGEST - 1).trimEnd()}…`;
}
