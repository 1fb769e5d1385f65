import Link from 'next/link';
import type { ReactNode } from 'react';

/** A link that a key also follows, such as ArrowLeft to the previous of a series. */
export function KeyLink(props: { href: string; shortcut: string; children: ReactNode; className?: string }) {
  return (
    <Link href={props.href} aria-keyshortcuts={props.shortcut} className={props.className}>
      {props.children}
    </Link>
  );
}
