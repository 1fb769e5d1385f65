'use client';

import Link from 'next/link';
import { usePathname } from 'next/navigation';
import styles from './nav-links.module.css';
import { type NavPlace, standsIn } from './stands-in';

export type { NavPlace };

/** The places of the site; the one the reader stands in is underlined and named to screen readers. */
export function NavLinks({ places }: { places: readonly NavPlace[] }) {
  const path = usePathname();
  return (
    <nav aria-label="Places" className={styles.links}>
      {places.map((place) => (
        <Link key={place.href} href={place.href} aria-current={standsIn(path, place)}>
          {place.label}
        </Link>
      ))}
    </nav>
  );
}
