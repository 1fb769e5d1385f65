'use client';

import { usePathname, useRouter, useSearchParams } from 'next/navigation';
import { useTransition } from 'react';
import { type TimeSpan, zoomedSpan } from './zoomed-span';

/**
 * The stretch of time a page shows, kept in its address as `from` and `to` (ISO 8601); an address without them shows
 * the latest points. Setting it asks the server for that stretch. `waiting` is true until the answer is drawn.
 */
export function useSpan(shown: TimeSpan, whole: TimeSpan) {
  const router = useRouter();
  const path = usePathname();
  const search = useSearchParams();
  const [waiting, begin] = useTransition();

  const go = (span: TimeSpan | null) => {
    const next = new URLSearchParams(search);
    next.delete('from');
    next.delete('to');
    next.delete('at');
    if (span !== null) {
      next.set('from', new Date(span.from).toISOString());
      next.set('to', new Date(span.to).toISOString());
    }
    const query = next.toString();
    begin(() => router.replace(query === '' ? path : `${path}?${query}`, { scroll: false }));
  };

  const show = (span: TimeSpan) => go(span);
  return {
    waiting,
    show,
    all: () => show(whole),
    latest: () => go(null),
    change: (change: Parameters<typeof zoomedSpan>[2]) => show(zoomedSpan(shown, whole, change) ?? whole),
    isLatest: !search.has('from') && !search.has('to') && shown.to >= whole.to,
    isWhole: shown.from <= whole.from && shown.to >= whole.to,
  };
}
