import type { ReactNode } from 'react';
import styles from './beside.module.css';

/** Details that open in place, beside what they explain, never over it. */
export function Beside(props: { summary: ReactNode; children: ReactNode; open?: boolean }) {
  return (
    <details className={styles.beside} open={props.open}>
      <summary>{props.summary}</summary>
      <div>{props.children}</div>
    </details>
  );
}
