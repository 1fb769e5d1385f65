'use client';

import { useRouter } from 'next/navigation';
import { type ReactNode, useCallback, useMemo } from 'react';
import { AtCursor } from './at-cursor';
import { ChartKey } from './chart-key';
import { chartMarkShape } from './chart-mark-shape';
import { ChartStack } from './chart-stack';
import { dayTicks } from './day-ticks';
import { plotFrame } from './plot-frame';
import { PointTable } from './point-table';
import { SpanButtons } from './span-buttons';
import type { ExpectedSpan, LimitSpan, StreamChartPoint, StreamEvent } from './stream-chart-point';
import styles from './stream-charts.module.css';
import type { DopingTick } from './stream-panel-layers';
import { streamPanels } from './stream-panels';
import { useCursor } from './use-cursor';
import { useSpan } from './use-span';
import { useWidth } from './use-width';

export interface StreamChartsProps {
  /** What the charts are of, for screen readers: "n-epi 5.6 Ω·cm, reactor 2 right". */
  name: string;
  /** In order of `index`, already thinned. */
  points: readonly StreamChartPoint[];
  /** How many points the stretch holds before thinning. */
  pointsInSpan: number;
  limits: readonly LimitSpan[];
  events: readonly StreamEvent[];
  expected: readonly ExpectedSpan[];
  dopingTicks: readonly DopingTick[];
  /** Unit of the doping scale, such as "10¹⁴ cm⁻³ phosphorus". */
  dopingUnit: string;
  /** Unit of level, moving range and spread between wafers. */
  unit: string;
  /** What the level is, such as "Ω·cm at 23 °C". */
  levelLabel: string;
  withinLabel: string;
  /** Words for each completion that occurs: "8 in a row below the centre line". */
  completionWords: Readonly<Record<string, string>>;
  /** The stretch shown and all there is, ISO 8601. */
  shown: { from: string; to: string };
  whole: { from: string; to: string };
  selectedId: string | null;
  download?: { href: string; label: string };
  /** What stands beside the charts, under "At the cursor". */
  children?: ReactNode;
}

const time = (span: { from: string; to: string }) => ({
  from: Date.parse(span.from),
  to: Date.parse(span.to),
});

/** The charts of a stream on one axis with one cursor, and beside them what stands at the cursor. */
export function StreamCharts(props: StreamChartsProps) {
  const { points, limits, events, expected, completionWords, unit } = props;
  const router = useRouter();
  const [stack, width] = useWidth<HTMLDivElement>();
  const span = useSpan(time(props.shown), time(props.whole));
  const from = points[0]?.index ?? 0;
  const to = points.at(-1)?.index ?? 0;
  const hasDoping = props.dopingTicks.length > 0;

  const panels = useMemo(() => {
    const units = { level: props.levelLabel, 'moving-range': unit, within: props.withinLabel, between: unit };
    return streamPanels({ points, limits, expected, view: { from, to }, units });
  }, [points, limits, expected, from, to, unit, props.levelLabel, props.withinLabel]);
  const frame = useMemo(
    () => (width === null ? null : plotFrame(width, { from, to }, { dopingScale: hasDoping })),
    [width, from, to, hasDoping],
  );
  const days = useMemo(
    () => dayTicks(points, Math.max(2, Math.floor((width ?? 800) / 110))),
    [points, width],
  );
  const seenEvents = useMemo(
    () => events.filter(({ index }) => index >= from - 0.5 && index <= to + 0.5),
    [events, from, to],
  );
  const seenLimits = limits.filter(({ fromIndex, toIndex }) => toIndex >= from && fromIndex <= to);
  const wordsOf = useCallback(
    (point: StreamChartPoint) => [
      ...(point.outOfSpecification ? ['out of specification'] : []),
      ...point.completions.map((completion) => completionWords[completion] ?? completion),
    ],
    [completionWords],
  );

  const cursor = useCursor({
    points,
    frame,
    selectedId: props.selectedId,
    onOpen: (place) => {
      const href = points[place]?.href;
      if (href !== undefined) router.push(href);
    },
    onSelect: (left, right) => {
      const inside = points.filter(({ index }) => index >= left && index <= right);
      const [first, last] = [inside[0], inside.at(-1)];
      if (first && last && first !== last) span.show({ from: Date.parse(first.at), to: Date.parse(last.at) });
    },
  });
  const point = cursor.pointAt === null ? undefined : points[cursor.pointAt];
  if (point === undefined) return <p className="quiet">No points in this stretch of time.</p>;
  const about = Date.parse(point.at);

  return (
    <div className="with-beside">
      <div>
        <SpanButtons
          isWhole={span.isWhole}
          waiting={span.waiting}
          onCloser={() => span.change({ about, factor: 0.5 })}
          onWider={() => span.change({ about, factor: 2 })}
          onShift={(shift) => span.change({ shift })}
          onAll={span.all}
          isLatest={span.isLatest}
          onLatest={span.latest}
        />
        <p className={styles.readout} aria-hidden="true">
          <b>{point.texts.level}</b> <span className="quiet">{point.label}</span>{' '}
          <span className="call">{wordsOf(point).map((words) => `◆ ${words} `)}</span>
        </p>
        <ChartStack
          name={props.name}
          stack={stack}
          frame={frame}
          panels={panels}
          points={points}
          point={point}
          pointWords={wordsOf(point)}
          events={seenEvents}
          days={days}
          dopingTicks={props.dopingTicks}
          dopingUnit={props.dopingUnit}
          completionWords={completionWords}
          cursor={cursor}
          busy={span.waiting}
        />
        <ChartKey
          shown={new Set(points.flatMap((one) => panels.map(({ chart }) => chartMarkShape(one, chart))))}
          limits={seenLimits.length > 0}
          expected={expected.length > 0}
          provisional={seenLimits.some(({ state }) => state === 'provisional')}
          interval={panels.some(({ segments }) => segments.some(({ interval }) => interval !== null))}
        />
        {props.pointsInSpan > points.length && (
          <p className="quiet small">
            {points.length} of {props.pointsInSpan} points are drawn; every signal and every extreme is among
            them. Look closer to see more.
          </p>
        )}
        <PointTable
          points={points}
          wordsOf={wordsOf}
          hasBetween={panels.length > 3}
          {...(props.download && { download: props.download })}
        />
      </div>
      <aside>
        <AtCursor
          point={point}
          signals={point.completions.map((completion) => completionWords[completion] ?? completion)}
          events={seenEvents.filter(({ index }) => Math.ceil(index) === point.index)}
          hasExpected={expected.length > 0}
          hasBetween={panels.length > 3}
        />
        {props.children}
      </aside>
    </div>
  );
}
