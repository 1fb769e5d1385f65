import type { PlotPoint } from './curve-path';
import styles from './curve-plot.module.css';

/** A point with its name. */
export interface PlotMark extends PlotPoint {
  label: string;
  kind: 'expected' | 'measured';
  /** Stands for the point, where letters tell several kinds apart. */
  letter?: string;
}

/** Points on a drawing of curves: what is expected as a ring with its name, what was measured filled or as a letter. */
export function CurveMarks(props: {
  marks: readonly PlotMark[];
  across: (value: number) => number;
  up: (value: number) => number;
  width: number;
}) {
  const { across, up, width } = props;
  return props.marks.map((mark, nth) => {
    const [left, top] = [across(mark.x), up(mark.y)];
    const isRight = left > width * 0.6;
    const circle =
      mark.letter === undefined ? (
        <circle
          className={styles['mark']}
          data-kind={mark.kind}
          cx={left}
          cy={top}
          r={mark.kind === 'measured' ? 3.5 : 6}
        >
          <title>{mark.label}</title>
        </circle>
      ) : (
        <text className={styles['letter']} x={left} y={top + 4} textAnchor="middle">
          {mark.letter}
          <title>{mark.label}</title>
        </text>
      );
    return (
      <g key={nth}>
        {circle}
        {mark.kind === 'expected' && (
          <text
            className={styles['name']}
            x={left + (isRight ? -10 : 10)}
            y={top - 8}
            textAnchor={isRight ? 'end' : 'start'}
          >
            {mark.label}
          </text>
        )}
      </g>
    );
  });
}
