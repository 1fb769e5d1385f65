import Link from 'next/link';
import type { ReactNode } from 'react';
import styles from './page-head.module.css';

/** How a page begins: its answer in one sentence, then what it rests on. `back` is the page above; Escape goes there. */
export function PageHead(props: {
  answer: ReactNode;
  sub?: ReactNode;
  back?: { href: string; label: string };
  /** Links to what lies beside this page, such as the previous and next of a series. */
  children?: ReactNode;
}) {
  return (
    <div className={styles.head}>
      {props.back && (
        <Link href={props.back.href} aria-keyshortcuts="Escape" className={styles.back}>
          ← {props.back.label}
        </Link>
      )}
      <h1>{props.answer}</h1>
      {props.sub !== undefined && <p className="quiet">{props.sub}</p>}
      {props.children}
    </div>
  );
}
