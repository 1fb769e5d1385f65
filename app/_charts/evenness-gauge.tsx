import { drawing, oneDecimal } from './drawing';
import { gaugeMark } from './gauge-mark';
import styles from './gauge.module.css';
import { linearScale } from './linear-scale';

export interface EvennessGaugeProps {
  /** Within-wafer spread of the newest wafer, in percent; null where undefined. */
  nowPercent: number | null;
  /** Its usual range (the limits in force); null while there are none. */
  usual: { lowerPercent: number; upperPercent: number } | null;
  call: boolean;
  label: string;
}

const width = 96;
const height = 30;
const middle = height / 2;

/**
 * Evenness now against its usual range, on a scale that runs from none to twice the usual upper end,
 * so that the box stands at the same place on every row and only the mark moves.
 */
export function EvennessGauge({ nowPercent, usual, call, label }: EvennessGaugeProps) {
  const view = `0 0 ${width} ${height}`;
  if (usual === null || usual.upperPercent <= 0) {
    return <svg role="img" aria-label={label} viewBox={view} className={styles.evenness} />;
  }
  const scale = linearScale([0, 2 * usual.upperPercent], [2, width - 8], { clamp: true });
  const x = (percent: number) => oneDecimal(scale(percent));
  const [left, right] = [x(usual.lowerPercent), x(usual.upperPercent)];
  const beyond = nowPercent !== null && nowPercent > 2 * usual.upperPercent;
  return (
    <svg
      role="img"
      aria-label={label}
      viewBox={view}
      className={styles.evenness}
      dangerouslySetInnerHTML={drawing([
        { d: `M0 ${middle}H${width}`, className: styles.rule },
        { d: `M${left} ${middle - 5}H${right}v10H${left}z`, className: styles.usual },
        nowPercent === null ? null : gaugeMark(x(nowPercent), middle, call),
        beyond ? { d: `M${width - 1} 10l5 5l-5 5`, className: styles.callAway } : null,
      ])}
    />
  );
}
