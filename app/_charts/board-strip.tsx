import { Mark } from './mark';
import { STRIP_REACH, type StripPoint, stripMarks, stripY } from './strip-marks';
import { stripWords } from './strip-words';

export interface BoardStripProps {
  /** Oldest first; at most 30. */
  points: readonly StripPoint[];
  /** What physics expects, in the same units; null where nothing is expected. */
  band: { lowerZ: number; upperZ: number } | null;
  /** The limits are provisional: dashed. Null: there are no limits, and none are drawn. */
  limits: 'provisional' | 'approved' | null;
}

const box = { width: 340, height: 42, slots: 30, inset: 6 };

/** The last levels of a stream between their limits, drawn by the server: every row shares one vertical scale. */
export function BoardStrip({ points, band, limits }: BoardStripProps) {
  const { marks, lines } = stripMarks(points, box);
  const limitStyle = { stroke: 'var(--stat)' };
  const dash = limits === 'provisional' ? '5 4' : undefined;
  const seen = band !== null && band.upperZ > -STRIP_REACH && band.lowerZ < STRIP_REACH;
  const bandTop = band === null ? 0 : stripY(band.upperZ, box.height);
  const bandHeight = band === null ? 0 : Math.max(1, stripY(band.lowerZ, box.height) - bandTop);
  return (
    <svg
      role="img"
      aria-label={stripWords(points)}
      viewBox={`0 0 ${box.width} ${box.height}`}
      style={{ width: '100%', maxWidth: box.width, overflow: 'visible' }}
    >
      {seen && <rect y={bandTop} width={box.width} height={bandHeight} fill="url(#hatch-expected)" />}
      {limits !== null &&
        [3, -3].map((z) => (
          <line
            key={z}
            x2={box.width}
            y1={stripY(z, box.height)}
            y2={stripY(z, box.height)}
            style={limitStyle}
            strokeDasharray={dash}
          />
        ))}
      {lines.map((line) => (
        <polyline key={line} points={line} fill="none" style={{ stroke: 'var(--ink)' }} strokeWidth={1} />
      ))}
      {marks.map((mark) => (
        <g key={mark.x}>
          <Mark x={mark.x} y={mark.y} shape={mark.shape} size={1.8} />
          {mark.beyond && (
            <path
              d={
                mark.y < box.height / 2
                  ? `M${mark.x - 4} ${mark.y - 5}l4 -4l4 4`
                  : `M${mark.x - 4} ${mark.y + 5}l4 4l4 -4`
              }
              fill="none"
              style={{ stroke: 'var(--call)' }}
              strokeWidth={1.4}
            />
          )}
        </g>
      ))}
    </svg>
  );
}
