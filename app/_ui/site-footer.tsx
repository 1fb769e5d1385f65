import type { ReactNode } from 'react';
import styles from './site-footer.module.css';

/** The quiet line under every page. */
export function SiteFooter({ children }: { children: ReactNode }) {
  return (
    <footer className={styles.foot}>
      <p>{children}</p>
      <p>
        <kbd>?</kbd> shows the keys
      </p>
    </footer>
  );
}
