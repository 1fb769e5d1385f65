import { DataTable } from '@/app/_ui/data-table';
import type { OwnSession } from '@/lib/access/own-sessions';
import { formatDateTime } from '@/lib/format';

/** Where a person is signed in, the session that asks marked by a word. */
export function SessionTable({ sessions, timeZone }: { sessions: readonly OwnSession[]; timeZone: string }) {
  return (
    <DataTable
      caption="Your sessions"
      captionUnseen
      rows={sessions}
      rowKey={(session) => String(session.startedAt.getTime())}
      columns={[
        {
          key: 'started',
          head: 'since',
          cell: ({ startedAt, isThis }) =>
            `${formatDateTime(startedAt, timeZone)}${isThis ? ', this one' : ''}`,
        },
        { key: 'ends', head: 'ends', cell: ({ expiresAt }) => formatDateTime(expiresAt, timeZone) },
        { key: 'from', head: 'from', cell: ({ ipAddress }) => ipAddress ?? '—' },
        { key: 'by', head: 'by', cell: ({ userAgent }) => (userAgent ?? '—').slice(0, 120) },
      ]}
    />
  );
}
