import { labelLanes } from './label-lanes';
import { frameX, type PlotFrame } from './plot-frame';
import type { StreamEvent } from './stream-chart-point';
import styles from './stream-charts.module.css';

const LANES = 3;
const LANE_HEIGHT = 16;
const CHARACTER_WIDTH = 6.4;

/** The words of events above the charts, each beginning at its dotted line; in lanes, so that none covers another. */
export function EventLabels({ events, frame }: { events: readonly StreamEvent[]; frame: PlotFrame }) {
  const places = labelLanes(
    events.map((event) => ({ x: frameX(frame, event.index), width: event.text.length * CHARACTER_WIDTH })),
    { lanes: LANES, right: frame.width },
  );
  const used = Math.max(0, ...places.map((place) => (place.lane ?? -1) + 1));
  return (
    <div className={styles.events} style={{ height: used * LANE_HEIGHT }}>
      {events.map((event, at) => {
        const place = places[at];
        if (place === undefined || place.lane === null) return null;
        return (
          <span
            key={`${event.index} ${event.text}`}
            data-kind={event.kind}
            style={{ left: place.x, bottom: place.lane * LANE_HEIGHT }}
          >
            {event.text}
          </span>
        );
      })}
    </div>
  );
}
