import { Button } from '../_ui/button';
import styles from './stream-charts.module.css';

/** The zoom of the charts as buttons: what a drag does with a mouse, for keys and fingers. */
export function SpanButtons(props: {
  isWhole: boolean;
  isLatest: boolean;
  waiting: boolean;
  onCloser: () => void;
  onWider: () => void;
  onShift: (share: number) => void;
  onAll: () => void;
  onLatest: () => void;
}) {
  return (
    <div className={styles.buttons} role="group" aria-label="Stretch of time shown">
      <Button aria-keyshortcuts="+" onClick={props.onCloser}>
        Closer
      </Button>
      <Button aria-keyshortcuts="-" onClick={props.onWider} disabled={props.isWhole}>
        Wider
      </Button>
      <Button onClick={() => props.onShift(-0.5)} disabled={props.isWhole}>
        Earlier
      </Button>
      <Button onClick={() => props.onShift(0.5)} disabled={props.isWhole}>
        Later
      </Button>
      <Button onClick={props.onAll} disabled={props.isWhole}>
        All
      </Button>
      <Button onClick={props.onLatest} disabled={props.isLatest}>
        Latest
      </Button>
      <span role="status" className="quiet small">
        {props.waiting ? 'Reading…' : ''}
      </span>
    </div>
  );
}
