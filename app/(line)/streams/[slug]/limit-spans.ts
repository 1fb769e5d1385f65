import type { LimitSpan, TwoSidedLimits } from '@/app/_charts/stream-chart-point';
import { type Interval, limitInterval } from '@/lib/control/limit-interval';
import type { SpanPoint } from '@/lib/excursions/span-points';
import { limitsState } from '@/lib/excursions/stream-answer';
import type { StandingLimits } from '@/lib/excursions/stream-standing';

/**
 * The limits of a stretch as they were in force: one span for each run of subgroups judged by one revision, by place
 * among `points`. Subgroups that are not judged, or not yet, neither begin nor end a span; those judged before there
 * were any limits have none.
 */
export function limitSpans(
  points: readonly Pick<SpanPoint, 'state' | 'limitsId'>[],
  revisions: readonly StandingLimits[],
  factor: number,
): LimitSpan[] {
  const byId = new Map(revisions.map((revision) => [revision.id, revision]));
  const spans: LimitSpan[] = [];
  let open: { id: string | null; span: LimitSpan | null } = { id: null, span: null };
  points.forEach(({ state, limitsId }, index) => {
    if (state === 'judged' && limitsId !== open.id) {
      const revision = limitsId === null ? undefined : byId.get(limitsId);
      const span =
        revision === undefined ? null : { ...limitsOf(revision, factor), fromIndex: index, toIndex: index };
      if (span !== null) spans.push(span);
      open = { id: limitsId, span };
    } else if (open.span !== null) {
      open.span.toIndex = index;
    }
  });
  return spans;
}

function limitsOf(revision: StandingLimits, factor: number): Omit<LimitSpan, 'fromIndex' | 'toIndex'> {
  const { level, movingRange, within, between } = revision.limits;
  const state = limitsState(revision);
  const interval = state === 'young' ? limitInterval(revision.limits) : null;
  return {
    revision: revision.revision,
    state,
    level: {
      centre: level.centre * factor,
      lower: level.lower * factor,
      upper: level.upper * factor,
      ...(interval && intervalsOf(interval.level, factor)),
    },
    movingRange: { centre: movingRange.centre * factor, upper: movingRange.upper * factor },
    within: within && {
      lower: within.lower,
      centre: within.centre,
      upper: within.upper,
      ...(interval?.within && intervalsOf(interval.within, 1)),
    },
    between: between && { centre: between.centre * factor, upper: between.upper * factor },
  };
}

function intervalsOf(
  { lower, upper }: { lower: Interval; upper: Interval },
  factor: number,
): Pick<TwoSidedLimits, 'lowerInterval' | 'upperInterval'> {
  return {
    lowerInterval: [lower.low * factor, lower.high * factor],
    upperInterval: [upper.low * factor, upper.high * factor],
  };
}
