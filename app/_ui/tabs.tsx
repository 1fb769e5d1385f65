import Link from 'next/link';
import type { ReactNode } from 'react';
import styles from './tabs.module.css';

/** Views of the same thing, as links: the choice lives in the address. */
export function Tabs(props: {
  label: string;
  tabs: readonly { href: string; name: ReactNode; current: boolean }[];
}) {
  return (
    <nav aria-label={props.label} className={styles.tabs}>
      {props.tabs.map((tab) => (
        <Link
          key={tab.href}
          href={tab.href}
          aria-current={tab.current ? 'page' : undefined}
          scroll={false}
          prefetch={false}
        >
          {tab.name}
        </Link>
      ))}
    </nav>
  );
}
