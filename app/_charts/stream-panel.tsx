'use client';

import { memo } from 'react';
import { ComposedChart, Line, ReferenceArea, ReferenceLine, XAxis, YAxis } from 'recharts';
import type { ChartName } from '@/lib/control/completions-at';
import { axisTicks } from './axis-ticks';
import { chartMarkShape } from './chart-mark-shape';
import { chartValue } from './chart-value';
import type { LimitSegment } from './limit-segments';
import type { PlotFrame } from './plot-frame';
import type { ExpectedSpan, StreamChartPoint, StreamEvent } from './stream-chart-point';
import { DopingScale, type DopingTick, Marks, ToleranceBrackets } from './stream-panel-layers';

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
 * Points left out of the judging are crossed and carry no line.
 */
export const StreamPanel = memo(function StreamPanel(props: StreamPanelProps) {
  const { chart, frame, domain, points, expected } = props;
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
      {expected.map((span) => (
        <ReferenceArea
          key={`band ${span.fromIndex}`}
          x1={Math.max(ends[0], span.fromIndex - 0.5)}
          x2={Math.min(ends[1], span.toIndex + 0.5)}
          y1={Math.max(domain[0], span.lower)}
          y2={Math.min(domain[1], span.upper)}
          ifOverflow="hidden"
          fill="url(#hatch-expected)"
          fillOpacity={1}
        />
      ))}
      {expected.map((span) => (
        <ReferenceLine
          key={`expected ${span.fromIndex}`}
          segment={[
            { x: Math.max(ends[0], span.fromIndex - 0.5), y: span.value },
            { x: Math.min(ends[1], span.toIndex + 0.5), y: span.value },
          ]}
          ifOverflow="hidden"
          stroke="var(--phys)"
          zIndex={200}
        />
      ))}
      {props.segments.map((piece) => (
        <LimitPiece key={`${piece.fromX} ${piece.part} ${piece.y}`} piece={piece} />
      ))}
      {props.segments.map((piece) =>
        piece.interval === null ? null : (
          <ReferenceArea
            key={`interval ${piece.fromX} ${piece.y}`}
            x1={piece.fromX}
            x2={piece.toX}
            y1={Math.max(domain[0], piece.interval[0])}
            y2={Math.min(domain[1], piece.interval[1])}
            ifOverflow="hidden"
            fill="var(--stat)"
            fillOpacity={0.16}
          />
        ),
      )}
      {props.events.map((event) => (
        <ReferenceLine
          key={`${event.index} ${event.text}`}
          x={event.index}
          ifOverflow="hidden"
          stroke={event.kind === 'onset' ? 'var(--call)' : 'var(--quiet)'}
          strokeDasharray="1.5 3"
          zIndex={250}
        />
      ))}
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
      <Marks points={points} chart={chart} />
      {expected.length > 0 && <ToleranceBrackets spans={expected} ends={ends} domain={domain} />}
      {props.dopingTicks.length > 0 && <DopingScale ticks={props.dopingTicks} domain={domain} />}
    </ComposedChart>
  );
});

function LimitPiece({ piece }: { piece: LimitSegment }) {
  return (
    <ReferenceLine
      segment={[
        { x: piece.fromX, y: piece.y },
        { x: piece.toX, y: piece.y },
      ]}
      ifOverflow="hidden"
      stroke="var(--stat)"
      strokeWidth={piece.part === 'limit' ? 1.3 : 0.8}
      {...(piece.dashed && { strokeDasharray: '5 4' })}
      zIndex={220}
    />
  );
}
