import Link from 'next/link';
import type { ReactNode } from 'react';
import { NavLinks, type NavPlace } from './nav-links';
import styles from './site-header.module.css';

/** The bar above every page: name, places, and on the right whatever is passed as children, then `place` and who. */
export function SiteHeader(props: {
  name: string;
  home: string;
  places: readonly NavPlace[];
  /** Site, shift or person, shown quietly at the right end. */
  place?: string;
  children?: ReactNode;
}) {
  return (
    <header className={styles.bar}>
      <Link href={props.home} className={styles.name}>
        {props.name}
      </Link>
      <NavLinks places={props.places} />
      <div className={styles.right}>
        {props.children}
        {props.place !== undefined && <span className="quiet">{props.place}</span>}
      </div>
    </header>
  );
}
