'use client';

import { useRouter } from 'next/navigation';
import { type ReactNode, useCallback, useMemo } from 'react';
import { AtCursor } from './at-cursor';
import { ChartKey } from './chart-key';
import { chartMarkShape, completionsOf } from './chart-mark-shape';
import { dayTicks } from './day-ticks';
import { EventLabels } from './event-labels';
import { frameX, plotFrame } from './plot-frame';
import { PointTable } from './point-table';
import { SpanButtons } from './span-buttons';
import type { ExpectedSpan, LimitSpan, StreamChartPoint, StreamEvent } from './stream-chart-point';
import styles from './stream-charts.module.css';
import { DAYS_HEIGHT, StreamPanel } from './stream-panel';
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
const noTicks: readonly DopingTick[] = [];

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
    () => events.filter(({ index }) => index >= from && index <= to),
    [events, from, to],
  );
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
  const x = frame === null ? null : frameX(frame, point.index);
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
          onAll={() => span.show(null)}
        />
        <p className={styles.readout} aria-hidden="true">
          <b>{point.texts.level}</b> <span className="quiet">{point.label}</span>{' '}
          <span className="call">{wordsOf(point).map((words) => `◆ ${words} `)}</span>
        </p>
        <div ref={stack} className={styles.stack} aria-busy={span.waiting}>
          {frame !== null && <EventLabels events={seenEvents} frame={frame} />}
          {panels.map((panel, at) => {
            const isLowest = at === panels.length - 1;
            const latest = points.findLast((one) => completionsOf(one, panel.chart).length > 0);
            const words =
              latest && completionsOf(latest, panel.chart).map((one) => completionWords[one] ?? one);
            return (
              <figure
                key={panel.chart}
                className={styles.panel}
                aria-label={`${panel.title}, ${panel.unit}: ${props.name}`}
              >
                <figcaption>
                  <b>{panel.title}</b> <span className="unit">{panel.unit}</span>
                  {latest && (
                    <span className="call">
                      ◆ {latest.label}: {words?.join(', ')}
                    </span>
                  )}
                  {at === 0 && hasDoping && <span className={styles.dopingUnit}>{props.dopingUnit}</span>}
                </figcaption>
                <div className={styles.plot} style={{ height: panel.height + (isLowest ? DAYS_HEIGHT : 0) }}>
                  {frame !== null && (
                    <StreamPanel
                      chart={panel.chart}
                      frame={frame}
                      height={panel.height}
                      points={points}
                      domain={panel.domain}
                      segments={panel.segments}
                      events={seenEvents}
                      expected={panel.expected}
                      dopingTicks={at === 0 ? props.dopingTicks : noTicks}
                      days={isLowest ? days : null}
                    />
                  )}
                  {x !== null && <div className={styles.cursor} style={{ left: x, height: panel.height }} />}
                </div>
              </figure>
            );
          })}
          {cursor.drag !== null && (
            <div
              className={styles.drag}
              style={{
                left: Math.min(cursor.drag.from, cursor.drag.to),
                width: Math.abs(cursor.drag.to - cursor.drag.from),
              }}
            />
          )}
          <div
            ref={cursor.grip}
            className={styles.grip}
            role="slider"
            tabIndex={0}
            aria-label={`Cursor along the points of ${props.name}`}
            aria-valuemin={1}
            aria-valuemax={points.length}
            aria-valuenow={(cursor.pointAt ?? 0) + 1}
            aria-valuetext={[point.label, point.texts.at, point.texts.level, ...wordsOf(point)].join(', ')}
            {...cursor.handlers}
          />
        </div>
        <ChartKey
          shown={new Set(points.flatMap((one) => panels.map(({ chart }) => chartMarkShape(one, chart))))}
          expected={expected.length > 0}
          provisional={limits.some(({ state }) => state === 'provisional')}
          young={limits.some(({ state }) => state === 'young')}
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
          events={events.filter(({ index }) => index === point.index)}
          hasExpected={expected.length > 0}
          hasBetween={panels.length > 3}
        />
        {props.children}
      </aside>
    </div>
  );
}
