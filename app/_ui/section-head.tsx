import type { ReactNode } from 'react';
import styles from './section-head.module.css';

/** The heading of a piece of evidence, drawn into its rule; `aside` (links, a count) stands at the rule's end. */
export function SectionHead(props: { children: ReactNode; aside?: ReactNode; id?: string; level?: 2 | 3 }) {
  const Heading = props.level === 3 ? 'h3' : 'h2';
  return (
    <div className={styles.head}>
      <Heading id={props.id}>{props.children}</Heading>
      {props.aside !== undefined && <span className={styles.aside}>{props.aside}</span>}
    </div>
  );
}
