import styles from './baseline-chart.module.css';
import { linearScale } from './linear-scale';

export interface BaselineChartProps {
  title: string;
  /** In order. */
  points: readonly { level: number; beyond: boolean }[];
  limits: { lower: number; centre: number; upper: number };
  /** The limits in force, to compare; null where there are none. */
  current: { lower: number; centre: number; upper: number } | null;
  text: (value: number) => string;
}

const W = 1000;
const H = 220;

/** The levels of a baseline between the limits drawn from them, and those in force: marks and straight segments. */
export function BaselineChart({ title, points, limits, current, text }: BaselineChartProps) {
  const lines = [limits.lower, limits.upper, ...(current === null ? [] : [current.lower, current.upper])];
  const levels = points.map((point) => point.level);
  const least = Math.min(...levels, ...lines);
  const most = Math.max(...levels, ...lines);
  const pad = 0.06 * (most - least);
  const y = linearScale([least - pad, most + pad], [H, 0]);
  const x = linearScale([-0.5, points.length - 0.5], [0, W]);
  const line = (value: number, dash?: string) => (
    <line x2={W} y1={y(value)} y2={y(value)} strokeDasharray={dash} vectorEffect="non-scaling-stroke" />
  );
  const beyond = points.filter((point) => point.beyond).length;
  const words = `${title}: from ${text(limits.lower)} to ${text(limits.upper)}, ${beyond} of ${points.length} points beyond on some chart.`;
  return (
    <figure className={styles.chart}>
      <div className={styles.frame}>
        <svg role="img" aria-label={words} viewBox={`0 0 ${W} ${H}`} preserveAspectRatio="none">
          <g className={styles.limits}>
            {line(limits.lower)}
            {line(limits.centre)}
            {line(limits.upper)}
          </g>
          {current && (
            <g className={styles.current}>
              {line(current.lower, '2 5')}
              {line(current.upper, '2 5')}
            </g>
          )}
          <polyline
            className={styles.levels}
            points={levels.map((level, i) => `${x(i).toFixed(1)},${y(level).toFixed(1)}`).join(' ')}
            vectorEffect="non-scaling-stroke"
          />
        </svg>
        {points.map((point, i) => (
          <span
            key={i}
            className={point.beyond ? styles.beyond : styles.point}
            style={{ left: `${(x(i) / W) * 100}%`, top: `${(y(point.level) / H) * 100}%` }}
          />
        ))}
        {(['upper', 'centre', 'lower'] as const).map((name) => (
          <span key={name} className={styles.label} style={{ top: `${(y(limits[name]) / H) * 100}%` }}>
            {text(limits[name])}
          </span>
        ))}
      </div>
      <figcaption className="small quiet">
        Solid: the limits these levels set. {current && 'Dotted: those in force now. '}
        {beyond > 0 && '◆ beyond a limit, on this chart or another.'}
      </figcaption>
    </figure>
  );
}
