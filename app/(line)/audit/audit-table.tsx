import Link from 'next/link';
import { DataTable } from '@/app/_ui/data-table';
import type { ListedEntry } from '@/lib/access/audit-trail';
import { factWords, subjectWords } from '@/lib/access/audit-words';
import { formatDateTime } from '@/lib/format';
import styles from './audit-table.module.css';
import { subjectHref } from './subject-href';

/** Entries of the audit trail as a table: who did what, when, with what before and after, and why. */
export function AuditTable(props: { entries: readonly ListedEntry[]; timeZone: string; download: string }) {
  const { entries, timeZone } = props;
  return (
    <DataTable
      caption="Entries of the audit trail, the newest first"
      captionUnseen
      columns={[
        { key: 'entry', head: 'Entry', align: 'right', cell: ({ id }) => id },
        {
          key: 'at',
          head: 'When',
          cell: ({ at }) => (
            <time dateTime={at.toISOString()} className={styles.line}>
              {formatDateTime(at, timeZone)}
            </time>
          ),
        },
        {
          key: 'who',
          head: 'Who',
          cell: ({ actorName }) => <span className={styles.words}>{actorName}</span>,
        },
        {
          key: 'what',
          head: 'What',
          cell: (entry) => {
            const href = subjectHref(entry);
            const words = subjectWords(entry);
            if (entry.subjectId === entry.actorId && entry.subjectKind === 'person')
              return <span className={styles.words}>{entry.action}</span>;
            return (
              <span className={styles.words}>
                {entry.action}:{' '}
                {href === null ? (
                  words
                ) : (
                  <Link href={href} prefetch={false}>
                    {words}
                  </Link>
                )}
              </span>
            );
          },
        },
        {
          key: 'stream',
          head: 'Stream',
          cell: ({ stream }) =>
            stream && (
              <Link href={`/streams/${stream.slug}`} prefetch={false} className={styles.line}>
                {stream.name}
              </Link>
            ),
        },
        {
          key: 'facts',
          head: 'Before → after',
          cell: ({ before, after }) => (
            <span className={styles.words}>{factWords(before, after, timeZone).join('; ')}</span>
          ),
        },
        { key: 'why', head: 'Why', cell: ({ why }) => <span className={styles.words}>{why}</span> },
      ]}
      rows={entries}
      rowKey={(entry) => entry.id}
      download={{ href: props.download, label: 'These entries as CSV, at most the newest 100 000' }}
    />
  );
}
