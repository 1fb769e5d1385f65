import Link from 'next/link';
import type { ReactNode } from 'react';
import styles from './button.module.css';

/** A link that looks like a button: it goes somewhere to begin an action. */
export function ButtonLink(props: { href: string; children: ReactNode; weight?: 'main' | 'plain' }) {
  return (
    <Link href={props.href} className={props.weight === 'main' ? styles.main : styles.plain}>
      {props.children}
    </Link>
  );
}
