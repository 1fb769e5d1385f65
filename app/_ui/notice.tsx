import type { ReactNode } from 'react';
import styles from './notice.module.css';

/** A remark set apart. `call` needs a person and carries a diamond; `done` reports what was just done; `note` informs. */
export function Notice({ kind, children }: { kind: 'call' | 'done' | 'note'; children: ReactNode }) {
  return (
    <div
      className={kind === 'call' ? styles.call : styles.note}
      role={kind === 'note' ? undefined : 'status'}
    >
      {kind === 'call' && <span aria-hidden="true">◆ </span>}
      {children}
    </div>
  );
}
