'use client';

import { memo } from 'react';
import { ComposedChart, Line, XAxis, YAxis } from 'recharts';
import type { ChartName } from '@/lib/control/completions-at';
import { axisTicks } from './axis-ticks';
import { chartMarkShape } from './chart-mark-shape';
import { chartValue } from './chart-value';
import type { LimitSegment } from './limit-segments';
import type { PlotFrame } from './plot-frame';
import type { ExpectedSpan, StreamChartPoint, StreamEvent } from './stream-chart-point';
import { type DopingTick, PanelGround, PanelMarks } from './stream-panel-layers';

export interface StreamPanelProps {
  chart: ChartName;
  frame: PlotFrame;
  height: number;
  points: readonly StreamChartPoint[];
  domain: readonly [number, number];
  segments: readonly LimitSegment[];
  events: readonly StreamEvent[];
  expected: readonly ExpectedSpan[];
  dopingTicks: readonly DopingTick[];
  /** Labels under the lowest chart; null on the others. */
  days: readonly { index: number; day: string }[] | null;
}

const tickInk = { fill: 'var(--quiet)', fontSize: 12 };

/** Room that the axis of days takes under the lowest chart. */
export const DAYS_HEIGHT = 26;

/**
 * One chart of a stream, drawn once for its data: the cursor lives above it and never draws it again.
 * Points left out of the judging are crossed and the line passes them by.
 */
export const StreamPanel = memo(function StreamPanel(props: StreamPanelProps) {
  const { chart, frame, domain, points } = props;
  const lined = points
    .filter((point) => chartMarkShape(point, chart) !== 'cross')
    .map((point) => ({ x: point.index, y: chartValue(point, chart) }));
  const ticks = axisTicks(domain, props.height > 140 ? 5 : 3);
  const texts = new Map(ticks.map((tick) => [tick.value, tick.text]));
  const ends = [frame.from - 0.5, frame.to + 0.5] as const;
  const days = new Map((props.days ?? []).map(({ index, day }) => [index, day]));
  const daysHeight = props.days === null ? 0 : DAYS_HEIGHT;
  return (
    <ComposedChart
      width={frame.width}
      height={props.height + daysHeight}
      margin={{ top: 6, right: frame.right, bottom: 4, left: 0 }}
      data={lined}
      accessibilityLayer={false}
    >
      <XAxis
        dataKey="x"
        type="number"
        domain={[...ends]}
        allowDataOverflow
        ticks={[...days.keys()]}
        tickFormatter={(index: number) => days.get(index) ?? ''}
        interval="preserveStart"
        hide={props.days === null}
        height={daysHeight}
        tickSize={4}
        stroke="var(--edge)"
        tick={tickInk}
        axisLine={false}
      />
      <YAxis
        width={frame.left}
        domain={[...domain]}
        allowDataOverflow
        ticks={ticks.map((tick) => tick.value)}
        tickFormatter={(value: number) => texts.get(value) ?? ''}
        interval={0}
        tickSize={4}
        stroke="var(--edge)"
        tick={tickInk}
        axisLine={false}
      />
      <PanelGround
        ends={ends}
        domain={domain}
        expected={props.expected}
        segments={props.segments}
        events={props.events}
        dopingTicks={props.dopingTicks}
      />
      <Line
        dataKey="y"
        type="linear"
        stroke="var(--ink)"
        strokeWidth={1}
        connectNulls={false}
        isAnimationActive={false}
        activeDot={false}
        dot={false}
      />
      <PanelMarks points={points} chart={chart} domain={domain} />
    </ComposedChart>
  );
});
