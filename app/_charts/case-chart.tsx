import { callPlace } from './call-place';
import { casePlot, type CasePlotInput } from './case-plot';
import styles from './case-chart.module.css';
import { Mark } from './mark';

export interface CaseChartProps extends CasePlotInput {
  /** The chart in words, for those who hear it. */
  label: string;
  /** What the vertical axis is, such as "Level, Ω·cm at 23 °C". */
  axis: string;
  /** What happened, said at the subgroup that completed it. */
  call: { index: number; words: string } | null;
}

/**
 * The chart a case is about, drawn by the server: its subgroups and those around, the limits as they were in force,
 * the reach of the case washed, the subgroups that took part ringed. Drawn once wide and once narrow, so that words
 * keep their size; the style sheet shows one of them.
 */
export function CaseChart(props: CaseChartProps) {
  return (
    <figure className={styles.figure}>
      <figcaption className="quiet small">{props.axis}</figcaption>
      <Drawing {...props} width={980} height={270} className={styles.wide} />
      <Drawing {...props} width={356} height={230} className={styles.narrow} />
      <Key
        tookPart={props.points.some((point) => point.tookPart)}
        interval={hasInterval(props)}
        specification={props.specification.length > 0}
      />
    </figure>
  );
}

function Drawing(props: CaseChartProps & { width: number; height: number; className: string | undefined }) {
  const { width, height, call } = props;
  const plot = casePlot(props, { width, height });
  const { left, right, top, bottom } = plot.frame;
  const called = call && plot.marks.find((mark) => mark.index === call.index);
  const said = called && call ? callPlace(call.words, called.x, width) : null;
  const stat = { stroke: 'var(--stat)' };
  return (
    <svg role="img" aria-label={props.label} viewBox={`0 0 ${width} ${height}`} className={props.className}>
      <rect
        x={plot.wash.x}
        y={top}
        width={plot.wash.width}
        height={bottom - top}
        style={{ fill: 'var(--callwash)' }}
      />
      {plot.ticks.map((tick) => (
        <g key={tick.text}>
          <line x1={left - 4} x2={left} y1={tick.y} y2={tick.y} style={{ stroke: 'var(--edge)' }} />
          <text x={left - 8} y={tick.y + 4} textAnchor="end">
            {tick.text}
          </text>
        </g>
      ))}
      {plot.days.map((day) => (
        <text key={day.x} x={day.x} y={height - 5} textAnchor="middle">
          {day.text}
        </text>
      ))}
      <line x1={left} x2={right} y1={bottom} y2={bottom} style={{ stroke: 'var(--rule)' }} />
      {plot.limits.map((limit) => (
        <g key={`${limit.x1} ${limit.y}`}>
          {limit.interval && (
            <rect
              x={limit.x1}
              y={limit.interval.top}
              width={limit.x2 - limit.x1}
              height={limit.interval.bottom - limit.interval.top}
              style={{ fill: 'var(--stat)', fillOpacity: 0.25 }}
            />
          )}
          <line
            x1={limit.x1}
            x2={limit.x2}
            y1={limit.y}
            y2={limit.y}
            style={stat}
            strokeWidth={limit.part === 'centre' ? 0.8 : 1.3}
            strokeDasharray={limit.dashed ? '5 4' : undefined}
          />
        </g>
      ))}
      {plot.specification.map(({ x1, x2, y }) => (
        <line
          key={`${x1} ${y}`}
          x1={x1}
          x2={x2}
          y1={y}
          y2={y}
          style={{ stroke: 'var(--ink)' }}
          strokeDasharray="10 3 2 3"
        />
      ))}
      {plot.events.map((event) => (
        <g key={`${event.x} ${event.text}`}>
          <title>{event.text}</title>
          <line
            x1={event.x}
            x2={event.x}
            y1={top}
            y2={bottom}
            style={{ stroke: 'var(--quiet)' }}
            strokeDasharray="1 4"
          />
          <path d={`M${event.x - 4} ${bottom}h8l-4 -6z`} style={{ fill: 'var(--quiet)' }} />
        </g>
      ))}
      {called && (
        <line
          x1={called.x}
          x2={called.x}
          y1={18}
          y2={called.y}
          style={{ stroke: 'var(--call)', strokeOpacity: 0.6 }}
        />
      )}
      {plot.lines.map((line) => (
        <polyline key={line} points={line} fill="none" style={{ stroke: 'var(--ink)' }} />
      ))}
      {plot.marks.map((mark) => (
        <g key={mark.index}>
          {mark.tookPart && (
            <circle
              cx={mark.x}
              cy={mark.y}
              r={6.5}
              fill="none"
              style={{ stroke: 'var(--call)' }}
              strokeWidth={1}
            />
          )}
          <Mark x={mark.x} y={mark.y} shape={mark.shape} size={2.2} />
        </g>
      ))}
      {said && (
        <text x={said.x} y={13} textAnchor={said.anchor} style={{ fill: 'var(--call)', fontWeight: 600 }}>
          {call?.words}
        </text>
      )}
    </svg>
  );
}

/** Whether the case's chart, and not only another one of its stream, has limits that are drawn with their interval. */
function hasInterval({ limits, chart }: CaseChartProps): boolean {
  if (chart !== 'level' && chart !== 'within') return false;
  return limits.some((span) => span[chart]?.upperInterval !== undefined);
}

function Key(props: { tookPart: boolean; interval: boolean; specification: boolean }) {
  const { tookPart, interval, specification } = props;
  return (
    <ul className={`${styles.key} quiet small`} aria-label="Key to the chart">
      <li>
        <svg width="14" height="14" aria-hidden="true">
          <Mark x={7} y={7} shape="diamond" size={2} />
        </svg>
        completes a signal
      </li>
      {tookPart && (
        <li>
          <svg width="16" height="16" aria-hidden="true">
            <circle cx={8} cy={8} r={6.5} fill="none" style={{ stroke: 'var(--call)' }} />
            <Mark x={8} y={8} shape="dot" size={2} />
          </svg>
          took part
        </li>
      )}
      <li>
        <svg width="22" height="14" aria-hidden="true">
          <rect width="22" height="14" style={{ fill: 'var(--callwash)' }} />
        </svg>
        reach of the case
      </li>
      {interval && (
        <li>
          <svg width="22" height="14" aria-hidden="true">
            <rect width="22" height="14" style={{ fill: 'var(--stat)', fillOpacity: 0.25 }} />
          </svg>
          90 % interval of a limit not yet established
        </li>
      )}
      {specification && (
        <li>
          <svg width="26" height="14" aria-hidden="true">
            <line x2="26" y1="7" y2="7" style={{ stroke: 'var(--ink)' }} strokeDasharray="10 3 2 3" />
          </svg>
          specification
        </li>
      )}
    </ul>
  );
}
