import Link from 'next/link';
import { DataTable } from '@/app/_ui/data-table';
import { StateMark } from '@/app/_ui/state-mark';
import { whoWords } from '@/lib/excursions/excursion-words';
import { caseSentence } from '@/lib/excursions/stream-state';
import { subgroupLabel } from '@/lib/excursions/subgroup-label';
import type { ListedExcursion } from '@/lib/excursions/types';
import { formatAge, formatDateTime } from '@/lib/format';
import styles from '../cells.module.css';

/** Excursions as a table; each opens its own page. */
export function ExcursionTable(props: {
  excursions: readonly ListedExcursion[];
  now: Date;
  timeZone: string;
  download: string;
}) {
  const time = (at: Date) => formatDateTime(at, props.timeZone);
  return (
    <DataTable
      caption="Excursions, those nobody has answered first"
      captionUnseen
      columns={[
        {
          key: 'case',
          head: 'Excursion',
          cell: ({ id }) => (
            <Link href={`/excursions/${id}`} prefetch={false} className={styles.line}>
              case {id}
            </Link>
          ),
        },
        {
          key: 'what',
          head: 'What happened',
          cell: (row) => (
            <span className={styles.words}>
              <StateMark needsPerson={row.state === 'open'}>{caseSentence(row.signal)}</StateMark>
            </span>
          ),
        },
        {
          key: 'stream',
          head: 'Stream',
          cell: ({ stream }) => (
            <Link href={`/streams/${stream.slug}`} prefetch={false} className={styles.line}>
              {stream.name}
            </Link>
          ),
        },
        {
          key: 'since',
          head: 'From, and last',
          cell: ({ first, last, stream }) => (
            <span className={styles.line}>
              {subgroupLabel(stream.subgroup, first.key)}{' '}
              <span className="quiet small">{time(first.at)}</span>
              {last.key !== first.key && (
                <>
                  <br />
                  {subgroupLabel(stream.subgroup, last.key)}{' '}
                  <span className="quiet small">{time(last.at)}</span>
                </>
              )}
            </span>
          ),
        },
        { key: 'signals', head: 'Signals', align: 'right', cell: ({ signals }) => signals },
        {
          key: 'who',
          head: 'Who',
          cell: (row) => (
            <span className={styles.words}>
              {whoWords(row)}
              {row.cause !== null && <span className="quiet"> · {row.cause}</span>}
            </span>
          ),
        },
        {
          key: 'opened',
          head: 'Opened',
          cell: ({ openedAt }) => (
            <time dateTime={openedAt.toISOString()} title={time(openedAt)} className={styles.line}>
              {formatAge(Math.max(0, props.now.getTime() - openedAt.getTime()))} ago
            </time>
          ),
        },
      ]}
      rows={props.excursions}
      rowKey={(row) => row.id}
      download={{ href: props.download, label: 'Excursions as CSV' }}
    />
  );
}
