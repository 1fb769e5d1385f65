import { betweenLimitsFor } from '@/lib/control/between-limits';
import { type Interval, limitInterval } from '@/lib/control/limit-interval';
import type { LimitSet } from '@/lib/control/limit-set';
import { limitsState } from '@/lib/control/limits-state';
import type { LimitSpan, TwoSidedLimits } from './stream-chart-point';

/** A subgroup as far as its limits go: what judged it, and how many of its wafers count. */
export interface LimitedPoint {
  state: 'judged' | 'open' | 'not-judged';
  limitsId: string | null;
  between: number | null;
  wafers: number;
}

/** A revision of limits as the charts are drawn from it. */
export interface LimitRevision {
  id: string;
  revision: number;
  state: 'provisional' | 'approved';
  limits: LimitSet;
}

/**
 * The limits of a stretch as they were in force: one span for each run of subgroups judged by one revision, by place
 * among `points`. Subgroups that are not judged, or not yet, neither begin nor end a span; those judged before there
 * were any limits have none. Limits are multiplied by `factor`, but the spread within stays percent. Of a thinned
 * stretch `isDrawn` tells which places are drawn: the limit between wafers turns where one of these has another size.
 */
export function limitSpans(
  points: readonly LimitedPoint[],
  revisions: readonly LimitRevision[],
  options: { factor?: number; isDrawn?: (index: number) => boolean } = {},
): LimitSpan[] {
  const { factor = 1, isDrawn = () => true } = options;
  const byId = new Map(revisions.map((revision) => [revision.id, revision]));
  const spans: LimitSpan[] = [];
  let open: { id: string | null; limits: LimitSet | null; span: LimitSpan | null } | null = null;
  points.forEach((point, index) => {
    if (point.state === 'judged' && (open === null || point.limitsId !== open.id)) {
      const revision = point.limitsId === null ? undefined : byId.get(point.limitsId);
      const span =
        revision === undefined ? null : { ...drawn(revision, factor), fromIndex: index, toIndex: index };
      if (span !== null) spans.push(span);
      open = { id: point.limitsId, limits: revision?.limits ?? null, span };
    }
    if (open?.span == null) return;
    open.span.toIndex = index;
    if (isDrawn(index)) stepTo(open.span, open.limits?.between ?? null, point, index, factor);
  });
  return spans;
}

/** The limits of the spread between wafers turn where a subgroup has another number of them. */
function stepTo(
  span: LimitSpan,
  usual: LimitSet['between'],
  { state, between, wafers }: LimitedPoint,
  index: number,
  factor: number,
): void {
  if (usual === null || state !== 'judged' || between === null || wafers < 2) return;
  const limits = betweenLimitsFor(usual, wafers);
  const [centre, upper] = [limits.centre * factor, limits.upper * factor];
  if (span.between.at(-1)?.upper !== upper) span.between.push({ fromIndex: index, centre, upper });
}

function drawn(revision: LimitRevision, factor: number): Omit<LimitSpan, 'fromIndex' | 'toIndex'> {
  const { n, level, movingRange, within } = revision.limits;
  const state = limitsState(revision);
  const interval = state === 'established' || n < 2 ? null : limitInterval(revision.limits);
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
    between: [],
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
