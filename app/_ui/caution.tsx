import type { ReactNode } from 'react';
import styles from './caution.module.css';

/** The usual caution under any advice that touches equipment; `children` is the advice itself. */
export function Caution({ children }: { children?: ReactNode }) {
  return (
    <div className={styles.caution}>
      {children}
      <p className="quiet small">
        Advice from figures alone. Follow site procedures and change control; work on equipment is for
        qualified staff.
      </p>
    </div>
  );
}
