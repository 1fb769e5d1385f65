import Link from 'next/link';
import type { ReactNode } from 'react';
import { StateMark } from '../_ui/state-mark';
import { BoardStrip, type BoardStripProps } from './board-strip';
import styles from './board-row.module.css';
import { EvennessGauge, type EvennessGaugeProps } from './evenness-gauge';
import { ExpectedGauge, type ExpectedGaugeProps } from './expected-gauge';

export interface BoardRowProps {
  href: string;
  name: string;
  /** Tool, chamber and diameter, quietly under the name. */
  place: string;
  strip: BoardStripProps;
  /**
   * Null where physics expects nothing of this stream. `text` is the figure beside, such as "+1.8 %", `under` the same
   * difference otherwise said, such as "−1.6 % of the value".
   */
  expected: (ExpectedGaugeProps & { text: string; unit: string; under?: string }) | null;
  evenness: EvennessGaugeProps & { text: string };
  newest: { href: string; name: string; age: string } | null;
  state: { needsPerson: boolean; words: string };
  /** Open excursions, quietly under the state: "case 41, nobody yet, 3 h 10 min". */
  cases?: ReactNode;
}

/** The heads of the board's columns; each cell says its own name to screen readers. */
export function BoardHead() {
  return (
    <div className={`${styles.row} ${styles.head}`} aria-hidden="true">
      <span>Stream</span>
      <span>Last 30 levels between their limits</span>
      <span>Level against expected</span>
      <span>Evenness, 1 s of the mean</span>
      <span>Newest wafer</span>
      <span>State</span>
    </div>
  );
}

/** One stream on the board; an item of a list. */
export function BoardRow(props: BoardRowProps) {
  const { expected, evenness, newest, state } = props;
  return (
    <li className={styles.row}>
      <div className={styles.name}>
        <Link href={props.href} prefetch={false}>
          {props.name}
        </Link>
        <span className="quiet small">{props.place}</span>
      </div>
      <div className={styles.strip}>
        <BoardStrip {...props.strip} />
      </div>
      <div className={styles.gauge}>
        {expected === null ? (
          <span className="quiet">—</span>
        ) : (
          <>
            <ExpectedGauge {...expected} />
            <span className={expected.call ? 'call' : undefined}>
              {expected.text} <span className="unit small">{expected.unit}</span>
              {expected.under !== undefined && <span className={styles.under}>{expected.under}</span>}
            </span>
          </>
        )}
      </div>
      <div className={styles.gauge}>
        <EvennessGauge {...evenness} />
        <span className={evenness.call ? 'call' : undefined}>
          {evenness.text} <span className={`${styles.cellName} unit small`}>evenness</span>
        </span>
      </div>
      <div className={`${styles.newest} small`}>
        {newest === null ? (
          <span className="quiet">no wafer yet</span>
        ) : (
          <>
            <Link href={newest.href} prefetch={false}>
              {newest.name}
            </Link>
            <span className="quiet"> · {newest.age}</span>
          </>
        )}
      </div>
      <div className={`${styles.state} small`}>
        <StateMark needsPerson={state.needsPerson}>{state.words}</StateMark>
        {props.cases !== undefined && <span className="quiet">{props.cases}</span>}
      </div>
    </li>
  );
}
