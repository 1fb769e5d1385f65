import { DataTable } from '@/app/_ui/data-table';
import { ACTION_WORDS } from '@/lib/excursions/excursion-words';
import type { ExcursionCase } from '@/lib/excursions/types';
import { formatDateTime } from '@/lib/format';
import styles from '../../cells.module.css';

/** The log of a case: who did what, when, in the order it happened. It is only ever added to. */
export function LogTable({ found, timeZone }: { found: ExcursionCase; timeZone: string }) {
  return (
    <DataTable
      caption="Log of this case"
      captionUnseen
      columns={[
        {
          key: 'at',
          head: 'When',
          cell: ({ at }) => <span className={styles.line}>{formatDateTime(at, timeZone)}</span>,
        },
        { key: 'who', head: 'Who', cell: ({ actor }) => actor },
        { key: 'what', head: 'What', cell: ({ action }) => ACTION_WORDS[action] },
        {
          key: 'note',
          head: 'Note',
          cell: ({ note }) => (
            <span className={styles.words} style={{ whiteSpace: 'pre-wrap', overflowWrap: 'anywhere' }}>
              {note || '—'}
            </span>
          ),
        },
      ]}
      rows={found.entries}
      rowKey={(entry) => entry.id}
      download={{ href: `/api/excursions/${found.id}/log`, label: 'Log as CSV' }}
    />
  );
}
