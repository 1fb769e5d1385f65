import { type DrawnPath, oneDecimal } from './drawing';
import styles from './gauge.module.css';

/** The mark of a gauge as one path: a dot, drawn as a point with round ends, or a diamond where a person is needed. */
export function gaugeMark(x: number, y: number, call: boolean): DrawnPath {
  return call
    ? { d: `M${x} ${oneDecimal(y - 5.2)}l5.2 5.2l-5.2 5.2l-5.2-5.2z`, className: styles.diamond }
    : { d: `M${x} ${y}h0`, className: styles.dot };
}
