import Link from 'next/link';
import { Figures } from '../_ui/figures';
import type { StreamChartPoint, StreamEvent } from './stream-chart-point';
import styles from './stream-charts.module.css';

const dash = '—';

/** The point under the cursor in figures and words, beside the charts; the same height for every point. */
export function AtCursor(props: {
  point: StreamChartPoint;
  /** The words of the patterns it completes. */
  signals: readonly string[];
  events: readonly StreamEvent[];
  hasExpected: boolean;
  hasBetween: boolean;
}) {
  const { point, signals } = props;
  const { texts } = point;
  return (
    <section className={styles.cursorPanel} aria-label="At the cursor">
      <p className="quiet small">At the cursor</p>
      <p className={styles.figure}>{texts.level}</p>
      <p className="small">
        <Link href={point.href} prefetch={false}>
          {point.label}
        </Link>{' '}
        · {texts.at}
        {point.open && ' · not complete'}
        {point.hollow && !point.open && ' · late or measured again'}
        {!point.judged && !point.open && ' · not judged'}
      </p>
      <Figures
        figures={[
          ...(props.hasExpected
            ? [
                { name: 'expected', value: texts.expected ?? dash, ink: 'expected' as const },
                { name: 'difference', value: texts.difference ?? dash },
                { name: 'as dopant', value: texts.dopant ?? dash },
                { name: 'stands for', value: texts.density ?? dash },
                {
                  name: 'on the one before',
                  value: texts.onBefore ?? dash,
                  definition:
                    'As dopant, with one standard uncertainty of the gauge’s repeatability alone: what is common to all wafers of a stream tells none from the next.',
                },
              ]
            : []),
          { name: 'moving range', value: texts.movingRange ?? dash },
          { name: 'within wafer', value: texts.within ?? dash },
          ...(props.hasBetween ? [{ name: 'between wafers', value: texts.between ?? dash }] : []),
        ]}
      />
      <ul className={`${styles.remarks} small`}>
        {point.outOfSpecification && <li className="call">◆ out of specification</li>}
        {signals.map((words) => (
          <li key={words} className="call">
            ◆ {words}
          </li>
        ))}
        {props.events.map((event) => (
          <li key={event.text}>{event.text}</li>
        ))}
        {texts.notes.map((note) => (
          <li key={note} className="quiet">
            {note}
          </li>
        ))}
      </ul>
    </section>
  );
}
