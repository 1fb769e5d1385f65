import styles from './board-strip.module.css';
import { STRIP_REACH, type StripPoint, stripMarks, stripY } from './strip-marks';
import { drawing, oneDecimal } from './drawing';
import { stripPaths } from './strip-paths';
import { stripWords, unscaledWords } from './strip-words';

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
  const paths = stripPaths(stripMarks(points, box), box.height);
  return (
    <svg
      role="img"
      aria-label={limits === null ? unscaledWords(points) : stripWords(points)}
      viewBox={`0 0 ${box.width} ${box.height}`}
      className={styles.strip}
      dangerouslySetInnerHTML={drawing([
        band === null ? null : bandMark(band),
        limits === null
          ? null
          : { d: LIMITS, className: limits === 'provisional' ? styles.dashed : styles.limits },
        { d: paths.lines, className: styles.line },
        { d: paths.dots, className: styles.dots },
        { d: paths.rings, className: styles.rings },
        { d: paths.rings, className: styles.holes },
        { d: paths.crosses, className: styles.crosses },
        { d: paths.diamonds, className: styles.diamonds },
        { d: paths.beyond, className: styles.beyond },
      ])}
    />
  );
}

const LIMITS = [3, -3].map((z) => `M0 ${stripY(z, box.height)}h${box.width}`).join('');

function bandMark({ lowerZ, upperZ }: { lowerZ: number; upperZ: number }) {
  if (upperZ <= -STRIP_REACH || lowerZ >= STRIP_REACH) return null;
  const top = stripY(upperZ, box.height);
  const height = Math.max(1, stripY(lowerZ, box.height) - top);
  return {
    d: `M0 ${oneDecimal(top)}h${box.width}v${oneDecimal(height)}h-${box.width}z`,
    className: styles.band,
  };
}
