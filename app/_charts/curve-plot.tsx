'use client';

import { useId } from 'react';
import { curvePath, type PlotPoint } from './curve-path';
import { CurveMarks, type PlotMark } from './curve-marks';
import { plotAxis, type PlotAxis } from './plot-axis';
import { useWidth } from './use-width';
import styles from './curve-plot.module.css';

export interface PlotCurve {
  name: string;
  /** Each piece is drawn by itself: where two published fits do not meet, a step stays a step. */
  pieces: readonly (readonly (PlotPoint | null)[])[];
  /** The curve in question; the others lie behind it, thinner. */
  isOwn: boolean;
}

export interface CurvePlotProps {
  /** What is drawn, for those who do not see it. */
  title: string;
  x: PlotAxis;
  y: PlotAxis;
  curves: readonly PlotCurve[];
  /** Points with their names: what is expected as a ring, what was measured filled, or as the letter of its kind. */
  marks: readonly PlotMark[];
  /** Places along the horizontal axis, each with its word. */
  places?: readonly { x: number; label: string }[];
  /** Levels across, such as the density underneath a layer. */
  levels?: readonly { y: number; label: string }[];
}

const UNKNOWN_WIDTH = 640;
const DASHES = ['', '9 4', '2 3', '9 3 2 3'];

/** Curves that physics expects, with points and places on them; its axes may be logarithmic. */
export function CurvePlot(props: CurvePlotProps) {
  const { x, y, curves, marks, places = [], levels = [] } = props;
  const clip = useId();
  const [element, known] = useWidth<HTMLDivElement>();
  const width = Math.max(240, known ?? UNKNOWN_WIDTH);
  const height = Math.round(Math.min(380, Math.max(240, width * 0.55)));
  const box = { left: 52, right: width - 12, top: 26, bottom: height - 40 };
  const across = plotAxis(x, [box.left, box.right], width < 480 ? 5 : 9);
  const up = plotAxis(y, [box.bottom, box.top], 7);
  const isInside = (point: PlotPoint) =>
    point.x >= x.domain[0] && point.x <= x.domain[1] && point.y >= y.domain[0] && point.y <= y.domain[1];
  return (
    <div ref={element} className={styles['holder']}>
      <svg role="img" aria-label={props.title} viewBox={`0 0 ${width} ${height}`} className={styles['plot']}>
        <clipPath id={clip}>
          <rect x={box.left} y={box.top} width={box.right - box.left} height={box.bottom - box.top} />
        </clipPath>
        <text x={box.left} y={14}>
          {y.label}
        </text>
        {up.ticks.map((tick) => (
          <g key={tick.value}>
            <line
              className={styles['grid']}
              x1={box.left}
              x2={box.right}
              y1={up.place(tick.value)}
              y2={up.place(tick.value)}
            />
            <text x={box.left - 6} y={up.place(tick.value) + 4} textAnchor="end">
              {tick.text}
            </text>
          </g>
        ))}
        {across.ticks.map((tick) => (
          <g key={tick.value}>
            <line
              className={styles['grid']}
              y1={box.top}
              y2={box.bottom}
              x1={across.place(tick.value)}
              x2={across.place(tick.value)}
            />
            <text x={across.place(tick.value)} y={box.bottom + 16} textAnchor="middle">
              {tick.text}
            </text>
          </g>
        ))}
        <text x={box.right} y={height - 6} textAnchor="end">
          {x.label}
        </text>
        <g clipPath={`url(#${clip})`}>
          {levels.map((level) => (
            <g key={level.label}>
              <line
                className={styles['level']}
                x1={box.left}
                x2={box.right}
                y1={up.place(level.y)}
                y2={up.place(level.y)}
              />
              <text x={box.right - 4} y={up.place(level.y) - 5} textAnchor="end">
                {level.label}
              </text>
            </g>
          ))}
          {places.map((place, at) => (
            <g key={place.label}>
              <line
                className={styles['level']}
                x1={across.place(place.x)}
                x2={across.place(place.x)}
                y1={box.top}
                y2={box.bottom}
              />
              <text
                x={across.place(place.x) + (across.place(place.x) > width / 2 ? -5 : 5)}
                y={box.bottom - 8 - 16 * (at % 3)}
                textAnchor={across.place(place.x) > width / 2 ? 'end' : 'start'}
              >
                {place.label}
              </text>
            </g>
          ))}
          {curves.map((curve, nth) =>
            curve.pieces.map((piece, at) => (
              <path
                key={`${curve.name} ${at}`}
                className={styles['curve']}
                data-own={curve.isOwn}
                strokeDasharray={DASHES[nth % DASHES.length]}
                d={curvePath(piece, across.place, up.place)}
              />
            )),
          )}
        </g>
        <CurveMarks marks={marks.filter(isInside)} across={across.place} up={up.place} width={width} />
      </svg>
      {curves.length > 1 && (
        <ul className={`${styles['key']} small`}>
          {curves.map((curve, nth) => (
            <li key={curve.name}>
              <svg width="34" height="10" aria-hidden="true">
                <line
                  className={styles['curve']}
                  data-own={curve.isOwn}
                  x2="34"
                  y1="5"
                  y2="5"
                  strokeDasharray={DASHES[nth % DASHES.length]}
                />
              </svg>
              {curve.name}
            </li>
          ))}
        </ul>
      )}
    </div>
  );
}
