'use client';

import { ZIndexLayer } from 'recharts';
import type { ChartName } from '@/lib/control/completions-at';
import { formatNumber } from '@/lib/format';
import { chartMarkShape } from './chart-mark-shape';
import { chartValue } from './chart-value';
import type { LimitSegment } from './limit-segments';
import { Mark } from './mark';
import { type PanelPlace, usePanelPlace } from './panel-place';
import type { ExpectedSpan, StreamChartPoint, StreamEvent } from './stream-chart-point';

export interface DopingTick {
  /** The charted value that this doping gives. */
  value: number;
  /** The doping, such as "7.90". */
  label: string;
}

/**
 * What lies behind the points of one chart, from back to front: expected band and tolerance, limits with their
 * intervals, events, and the doping scale. One layer that stays mounted while its contents change.
 */
export function PanelGround(props: {
  ends: readonly [number, number];
  domain: readonly [number, number];
  expected: readonly ExpectedSpan[];
  segments: readonly LimitSegment[];
  events: readonly StreamEvent[];
  dopingTicks: readonly DopingTick[];
}) {
  const place = usePanelPlace(props.domain);
  if (place === null) return null;
  return (
    <g>
      {props.expected.map((span) => (
        <Expected key={span.fromIndex} span={span} ends={props.ends} place={place} />
      ))}
      {props.segments.map((piece) => (
        <Limit key={`${piece.fromX} ${piece.y}`} piece={piece} place={place} />
      ))}
      {props.events.map((event) => (
        <line
          key={`${event.index} ${event.text}`}
          x1={place.x(event.index)}
          x2={place.x(event.index)}
          y1={place.top}
          y2={place.bottom}
          style={{ stroke: event.kind === 'onset' ? 'var(--call)' : 'var(--quiet)' }}
          strokeDasharray="1.5 3"
        />
      ))}
      {props.dopingTicks
        .filter((tick) => place.holds(tick.value))
        .map(({ value, label }) => (
          <g key={label} style={{ fill: 'var(--phys)', stroke: 'none' }}>
            <path d={`M${place.right} ${place.y(value)}h5`} style={{ stroke: 'var(--phys)' }} />
            <text x={place.right + 8} y={place.y(value)} dy="0.35em" style={{ fill: 'var(--phys)' }}>
              {label}
            </text>
          </g>
        ))}
    </g>
  );
}

/** The hatched band of uncertainty about the expected value, and round it the tolerance, apart, as brackets. */
function Expected(props: { span: ExpectedSpan; ends: readonly [number, number]; place: PanelPlace }) {
  const { span, ends, place } = props;
  const left = place.x(Math.max(ends[0], span.fromIndex - 0.5));
  const right = place.x(Math.min(ends[1], span.toIndex + 0.5));
  if (right <= left) return null;
  const top = place.y(span.upper);
  const serif = Math.min(14, (right - left) / 2);
  if (span.upper < place.low || span.lower > place.high) {
    const isBelow = span.upper < place.low;
    return (
      <text x={left + 6} y={isBelow ? place.bottom - 6 : place.top + 14} style={{ fill: 'var(--phys)' }}>
        {isBelow ? '↓' : '↑'} expected {formatNumber(span.value, 4)}
      </text>
    );
  }
  return (
    <g fill="none" style={{ stroke: 'var(--phys)' }}>
      <rect
        x={left}
        y={top}
        width={right - left}
        height={place.y(span.lower) - top}
        fill="url(#hatch-expected)"
        stroke="none"
      />
      {place.holds(span.value) && <path d={`M${left} ${place.y(span.value)}H${right}`} />}
      {[span.toleranceLower, span.toleranceUpper].map((edge, at) => {
        if (edge === null || !place.holds(edge)) return null;
        const y = place.y(edge);
        const back = y + (at === 0 ? -7 : 7);
        return (
          <path
            key={at}
            d={`M${left} ${back}V${y}h${serif}M${right - serif} ${y}H${right}V${back}`}
            strokeWidth={1.2}
          />
        );
      })}
    </g>
  );
}

function Limit({ piece, place }: { piece: LimitSegment; place: PanelPlace }) {
  const left = place.x(piece.fromX);
  const right = place.x(piece.toX);
  const top = piece.interval === null ? 0 : place.y(piece.interval[1]);
  return (
    <g>
      {piece.interval !== null && (
        <rect
          x={left}
          y={top}
          width={right - left}
          height={place.y(piece.interval[0]) - top}
          style={{ fill: 'var(--stat)', fillOpacity: 0.16 }}
        />
      )}
      <path
        d={`M${left} ${place.y(piece.y)}H${right}`}
        style={{ stroke: 'var(--stat)' }}
        strokeWidth={piece.part === 'limit' ? 1.3 : 0.8}
        strokeDasharray={piece.dashed ? '5 4' : undefined}
      />
    </g>
  );
}

/** The points of one chart, above its lines and never cut at the edge of the plot; signals lie on top. */
export function PanelMarks(props: {
  points: readonly StreamChartPoint[];
  chart: ChartName;
  domain: readonly [number, number];
}) {
  const place = usePanelPlace(props.domain);
  if (place === null) return null;
  let labelledX = Number.NEGATIVE_INFINITY;
  const marks = props.points.flatMap((point) => {
    const value = chartValue(point, props.chart);
    if (value === null) return [];
    const shape = chartMarkShape(point, props.chart);
    const x = place.x(point.index);
    const edge = value > props.domain[1] ? place.top + STRAY_INSET : place.bottom - STRAY_INSET;
    const isStray = !place.holds(value);
    const isLabelled = isStray && x - labelledX > STRAY_LABEL;
    if (isLabelled) labelledX = x;
    return [
      {
        id: point.id,
        x,
        y: isStray ? edge : place.y(value),
        shape,
        call: shape.endsWith('diamond'),
        stray: isLabelled ? { value, isHigh: value > props.domain[1] } : null,
      },
    ];
  });
  return (
    <ZIndexLayer zIndex={700}>
      {[...marks.filter((mark) => !mark.call), ...marks.filter((mark) => mark.call)].map(
        ({ id, x, y, shape, stray }) => (
          <g key={id}>
            <Mark x={x} y={y} shape={shape} size={shape === 'dot' ? 1.9 : 2.2} />
            {stray !== null && <Stray x={x} y={y} {...stray} right={place.right} />}
          </g>
        ),
      )}
    </ZIndexLayer>
  );
}

/** How far inside the edge a stray's mark lies, and the room its label takes: of strays close together the first has one. */
const STRAY_INSET = 8;
const STRAY_LABEL = 60;

/** A point beyond the axis stands at its edge, with an arrow that way and its value. */
function Stray(props: { x: number; y: number; value: number; isHigh: boolean; right: number }) {
  const { x, y, isHigh } = props;
  const isNearEnd = props.right - x < STRAY_LABEL;
  return (
    <text
      x={isNearEnd ? x - 10 : x + 10}
      y={y}
      dy="0.35em"
      textAnchor={isNearEnd ? 'end' : 'start'}
      style={{ fill: 'var(--ink)' }}
    >
      {isHigh ? '↑' : '↓'} {formatNumber(props.value, 4)}
    </text>
  );
}
