import Link from 'next/link';
import type { ReactNode } from 'react';
import { NavLinks, type NavPlace } from './nav-links';
import styles from './site-header.module.css';

/** The bar above every page: name, places, and on the right whatever is passed as children. */
export function SiteHeader(props: {
  name: string;
  home: string;
  places: readonly NavPlace[];
  children?: ReactNode;
}) {
  return (
    <header className={styles.bar}>
      <Link href={props.home} className={styles.name}>
        {props.name}
      </Link>
      {props.places.length > 0 && <NavLinks places={props.places} />}
      <div className={styles.right}>{props.children}</div>
    </header>
  );
}
