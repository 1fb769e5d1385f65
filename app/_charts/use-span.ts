'use client';

import { usePathname, useRouter, useSearchParams } from 'next/navigation';
import { useTransition } from 'react';
import { type TimeSpan, zoomedSpan } from './zoomed-span';

/**
 * The stretch of time a page shows, kept in its address as `from` and `to` (ISO 8601). Setting it asks the server
 * for that stretch; null shows everything. `waiting` is true until the answer is drawn.
 */
export function useSpan(shown: TimeSpan, whole: TimeSpan) {
  const router = useRouter();
  const path = usePathname();
  const search = useSearchParams();
  const [waiting, begin] = useTransition();

  const show = (span: TimeSpan | null) => {
    const next = new URLSearchParams(search);
    next.delete('from');
    next.delete('to');
    if (span !== null) {
      next.set('from', new Date(span.from).toISOString());
      next.set('to', new Date(span.to).toISOString());
    }
    const query = next.toString();
    begin(() => router.replace(query === '' ? path : `${path}?${query}`, { scroll: false }));
  };

  return {
    waiting,
    show,
    change: (change: Parameters<typeof zoomedSpan>[2]) => show(zoomedSpan(shown, whole, change)),
    isWhole: shown.from <= whole.from && shown.to >= whole.to,
  };
}
