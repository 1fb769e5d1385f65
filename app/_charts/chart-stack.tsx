'use client';

import type { RefObject } from 'react';
import { completionsOf } from './chart-mark-shape';
import { EventLabels } from './event-labels';
import { frameX, type PlotFrame } from './plot-frame';
import type { StreamChartPoint, StreamEvent } from './stream-chart-point';
import styles from './stream-charts.module.css';
import { DAYS_HEIGHT, StreamPanel } from './stream-panel';
import type { DopingTick } from './stream-panel-layers';
import type { PanelPlan } from './stream-panels';
import type { useCursor } from './use-cursor';

const noTicks: readonly DopingTick[] = [];

/**
 * A stream's charts, one above the other, with the cursor through all of them. The heights are reserved before the
 * width is known, so nothing jumps when the drawings appear.
 */
export function ChartStack(props: {
  name: string;
  stack: RefObject<HTMLDivElement | null>;
  frame: PlotFrame | null;
  panels: readonly PanelPlan[];
  points: readonly StreamChartPoint[];
  /** The point under the cursor, and what is said of it. */
  point: StreamChartPoint;
  pointWords: readonly string[];
  events: readonly StreamEvent[];
  days: readonly { index: number; day: string }[];
  dopingTicks: readonly DopingTick[];
  dopingUnit: string;
  completionWords: Readonly<Record<string, string>>;
  cursor: ReturnType<typeof useCursor>;
  busy: boolean;
}) {
  const { frame, panels, points, point, cursor, name } = props;
  const x = frame === null ? null : frameX(frame, point.index);
  return (
    <div ref={props.stack} className={styles.stack} aria-busy={props.busy}>
      {frame !== null && <EventLabels events={props.events} frame={frame} />}
      {panels.map((panel, at) => {
        const days = at === panels.length - 1 ? props.days : null;
        const dopingTicks = at === 0 ? props.dopingTicks : noTicks;
        return (
          <figure
            key={panel.chart}
            className={styles.panel}
            aria-label={`${panel.title}, ${panel.unit}: ${name}`}
          >
            <figcaption>
              <b>{panel.title}</b> <span className="unit">{panel.unit}</span>
              <LatestSignal panel={panel} points={points} words={props.completionWords} />
              {dopingTicks.length > 0 && <span className={styles.dopingUnit}>{props.dopingUnit}</span>}
            </figcaption>
            <div className={styles.plot} style={{ height: panel.height + (days === null ? 0 : DAYS_HEIGHT) }}>
              {frame !== null && (
                <StreamPanel
                  chart={panel.chart}
                  frame={frame}
                  height={panel.height}
                  points={points}
                  domain={panel.domain}
                  segments={panel.segments}
                  events={props.events}
                  expected={panel.expected}
                  dopingTicks={dopingTicks}
                  days={days}
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
        aria-label={`Cursor along the points of ${name}`}
        aria-valuemin={1}
        aria-valuemax={points.length}
        aria-valuenow={(cursor.pointAt ?? 0) + 1}
        aria-valuetext={[point.label, point.texts.at, point.texts.level, ...props.pointWords].join(', ')}
        {...cursor.handlers}
      />
    </div>
  );
}

/** The newest signal of a chart in words, beside its name: a diamond never stands for itself. */
function LatestSignal(props: {
  panel: PanelPlan;
  points: readonly StreamChartPoint[];
  words: Readonly<Record<string, string>>;
}) {
  const latest = props.points.findLast((point) => completionsOf(point, props.panel.chart).length > 0);
  if (latest === undefined) return null;
  const words = completionsOf(latest, props.panel.chart).map((one) => props.words[one] ?? one);
  const further = words.length > 1 ? `, and ${words.length - 1} more` : '';
  return (
    <span className="call">
      ◆ {latest.label}: {words[0]}
      {further}
    </span>
  );
}
