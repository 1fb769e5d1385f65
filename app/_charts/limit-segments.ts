import type { ChartName } from '@/lib/control/completions-at';
import type { LimitSpan } from './stream-chart-point';

/** A level stretch of a centre line or limit, in the units of the axes. */
export interface LimitSegment {
  fromX: number;
  toX: number;
  y: number;
  part: 'centre' | 'limit';
  /** The limits are provisional. */
  dashed: boolean;
  /** The limit's own 90 % interval, until the limits are established; else null. */
  interval: readonly [number, number] | null;
}

/**
 * The limits of one chart as the stepped lines to draw over the indices `from` to `to`, each revision over the
 * points it judged and half a step to either side. Revisions outside the span give nothing.
 *
 * @example limitSegments([span], 'moving-range', { from: 0, to: 24 }) // centre and upper limit, two segments
 */
export function limitSegments(
  spans: readonly LimitSpan[],
  chart: ChartName,
  view: { from: number; to: number },
): LimitSegment[] {
  return spans.flatMap((span) => {
    const dashed = span.state === 'provisional';
    return parts(span, chart).flatMap(({ from, to, ...piece }) => {
      const fromX = Math.max(from, view.from) - 0.5;
      const toX = Math.min(to, view.to) + 0.5;
      return toX <= fromX ? [] : [{ fromX, toX, dashed, ...piece }];
    });
  });
}

type Piece = Pick<LimitSegment, 'y' | 'part' | 'interval'> & { from: number; to: number };

function parts(span: LimitSpan, chart: ChartName): Piece[] {
  const [from, to] = [span.fromIndex, span.toIndex];
  const piece = (
    part: Piece['part'],
    y: number,
    interval: readonly [number, number] | null = null,
  ): Piece => ({
    from,
    to,
    part,
    y,
    interval,
  });
  if (chart === 'level' || chart === 'within') {
    const limits = span[chart];
    if (limits === null) return [];
    const { centre, lower, upper, lowerInterval, upperInterval } = limits;
    return [
      piece('centre', centre),
      piece('limit', lower, lowerInterval),
      piece('limit', upper, upperInterval),
    ];
  }
  if (chart === 'moving-range') {
    return [piece('centre', span.movingRange.centre), piece('limit', span.movingRange.upper)];
  }
  return span.between.flatMap(({ centre, upper }, at) => {
    const own = {
      from: at === 0 ? from : (span.between[at]?.fromIndex ?? from),
      to: (span.between[at + 1]?.fromIndex ?? to + 1) - 1,
    };
    return [
      { ...piece('centre', centre), ...own },
      { ...piece('limit', upper), ...own },
    ];
  });
}
