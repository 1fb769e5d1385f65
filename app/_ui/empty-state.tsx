import type { ReactNode } from 'react';
import styles from './empty-state.module.css';

/** An empty page or part: what will appear here, and how to make it so. */
export function EmptyState(props: { what: ReactNode; how: ReactNode; children?: ReactNode }) {
  return (
    <div className={styles.empty}>
      <p className={styles.what}>{props.what}</p>
      <p className="quiet">{props.how}</p>
      {props.children}
    </div>
  );
}
