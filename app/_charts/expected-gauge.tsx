import { drawing, oneDecimal } from './drawing';
import { gaugeMark } from './gauge-mark';
import styles from './gauge.module.css';
import { linearScale } from './linear-scale';

export interface ExpectedGaugeProps {
  /** Level against expected, in percent; null where either is undefined. */
  differencePercent: number | null;
  /** Half-width of the expectation's uncertainty, in percent. */
  uncertaintyPercent: number;
  /** The target's tolerance about expected, in percent; drawn apart from the uncertainty, as brackets. */
  tolerancePercent: { lower: number; upper: number } | null;
  /** Half-width of the scale in percent: the same on all rows that are compared. */
  reachPercent: number;
  /** The stream needs a person because of its level. */
  call: boolean;
  /** The gauge in words, for those who hear it. */
  label: string;
}

const width = 120;
const height = 30;
const middle = height / 2;

/** Level against what physics expects: a hatched band for the uncertainty, brackets for the tolerance, one mark. */
export function ExpectedGauge(props: ExpectedGaugeProps) {
  const { reachPercent: reach, tolerancePercent: tolerance, differencePercent: difference } = props;
  const scale = linearScale([-reach, reach], [8, width - 8], { clamp: true });
  const x = (percent: number) => oneDecimal(scale(percent));
  const [left, right] = [x(-props.uncertaintyPercent), x(props.uncertaintyPercent)];
  const bracket = (edge: number, arm: number) =>
    Math.abs(edge) > reach ? '' : `M${oneDecimal(x(edge) + arm)} 3H${x(edge)}V27h${arm}`;
  const brackets = tolerance === null ? '' : bracket(tolerance.lower, 4) + bracket(tolerance.upper, -4);
  const beyond = difference !== null && Math.abs(difference) > reach;
  return (
    <svg
      role="img"
      aria-label={props.label}
      viewBox={`0 0 ${width} ${height}`}
      className={styles.expected}
      dangerouslySetInnerHTML={drawing([
        { d: `M0 ${middle}H${width}`, className: styles.rule },
        { d: `M${left} 9H${right}v12H${left}z`, className: styles.band },
        { d: `M${x(0)} 6V24${brackets}`, className: styles.phys },
        difference === null ? null : gaugeMark(x(difference), middle, props.call),
        beyond
          ? {
              d: difference > 0 ? `M${width - 2} 10l5 5l-5 5` : 'M2 10l-5 5l5 5',
              className: props.call ? styles.callAway : styles.away,
            }
          : null,
      ])}
    />
  );
}
