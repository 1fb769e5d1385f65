'use client';

import { usePlotArea, useXAxisScale, useYAxisScale, ZIndexLayer } from 'recharts';
import type { ChartName } from '@/lib/control/completions-at';
import { chartMarkShape } from './chart-mark-shape';
import { chartValue } from './chart-value';
import { Mark } from './mark';
import type { ExpectedSpan, StreamChartPoint } from './stream-chart-point';

export interface DopingTick {
  /** The charted value that this doping gives. */
  value: number;
  /** The doping, such as "7.90". */
  label: string;
}

/** The second scale of a level chart: where each doping would stand, in the ink of physics. */
export function DopingScale({
  ticks,
  domain,
}: {
  ticks: readonly DopingTick[];
  domain: readonly [number, number];
}) {
  const plot = usePlotArea();
  const scale = useYAxisScale();
  if (plot === undefined || scale === undefined) return null;
  const x = plot.x + plot.width;
  return (
    <g>
      {ticks.map(({ value, label }) => {
        const y = scale(value);
        if (y === undefined || value < domain[0] || value > domain[1]) return null;
        return (
          <g key={label}>
            <line x1={x} x2={x + 5} y1={y} y2={y} style={{ stroke: 'var(--phys)' }} />
            <text x={x + 8} y={y} dy="0.35em" style={{ fill: 'var(--phys)' }}>
              {label}
            </text>
          </g>
        );
      })}
    </g>
  );
}

/** The target's tolerance as a pair of brackets round each expected span, apart from the band of uncertainty. */
export function ToleranceBrackets(props: {
  spans: readonly ExpectedSpan[];
  ends: readonly [number, number];
  domain: readonly [number, number];
}) {
  const xScale = useXAxisScale();
  const yScale = useYAxisScale();
  if (xScale === undefined || yScale === undefined) return null;
  const inside = (value: number) => value >= props.domain[0] && value <= props.domain[1];
  return (
    <g fill="none" style={{ stroke: 'var(--phys)' }} strokeWidth={1.2}>
      {props.spans.map((span) => {
        const left = xScale(Math.max(props.ends[0], span.fromIndex - 0.5));
        const right = xScale(Math.min(props.ends[1], span.toIndex + 0.5));
        if (left === undefined || right === undefined || right <= left) return null;
        return [span.toleranceLower, span.toleranceUpper].map((edge, at) => {
          const y = yScale(edge);
          if (y === undefined || !inside(edge)) return null;
          const back = at === 0 ? -7 : 7;
          return (
            <path
              key={`${span.fromIndex} ${at}`}
              d={`M${left} ${y + back}V${y}H${left + 14}M${right - 14} ${y}H${right}V${y + back}`}
            />
          );
        });
      })}
    </g>
  );
}

/** The points of one chart, above its lines and never cut at the edge of the plot; signals lie on top. */
export function Marks({ points, chart }: { points: readonly StreamChartPoint[]; chart: ChartName }) {
  const xScale = useXAxisScale();
  const yScale = useYAxisScale();
  if (xScale === undefined || yScale === undefined) return null;
  const marks = points.flatMap((point) => {
    const value = chartValue(point, chart);
    const x = xScale(point.index);
    const y = value === null ? undefined : yScale(value);
    const shape = chartMarkShape(point, chart);
    return x === undefined || y === undefined
      ? []
      : [{ id: point.id, x, y, shape, call: shape.endsWith('diamond') }];
  });
  return (
    <ZIndexLayer zIndex={700}>
      {[...marks.filter((mark) => !mark.call), ...marks.filter((mark) => mark.call)].map(
        ({ id, x, y, shape }) => (
          <Mark key={id} x={x} y={y} shape={shape} size={shape === 'dot' ? 1.9 : 2.2} />
        ),
      )}
    </ZIndexLayer>
  );
}
