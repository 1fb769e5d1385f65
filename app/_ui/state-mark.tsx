import type { ReactNode } from 'react';
import styles from './state-mark.module.css';

/** A state in a word, with a diamond before it when a person is needed: told by shape and word before colour. */
export function StateMark({ needsPerson, children }: { needsPerson: boolean; children: ReactNode }) {
  if (!needsPerson) return <span>{children}</span>;
  return (
    <span className={styles.call}>
      <span aria-hidden="true">◆ </span>
      {children}
    </span>
  );
}
