import type { ExcursionCase } from '@/lib/excursions/types';
import { formatDateTime } from '@/lib/format';

/** The adjustments and maintenance in the stretch that the chart shows; nothing when there were none. */
export function CaseEvents({ events, timeZone }: { events: ExcursionCase['events']; timeZone: string }) {
  if (events.length === 0) return null;
  return (
    <ul className="plain-list small" aria-label="Events in this stretch">
      {events.map(({ at, kind, text }) => (
        <li key={`${at.getTime()} ${text}`}>
          <span aria-hidden="true">▴ </span>
          <span className="quiet">
            {formatDateTime(at, timeZone)}, {kind}:
          </span>{' '}
          {text}
        </li>
      ))}
    </ul>
  );
}
