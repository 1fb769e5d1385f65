import { DataTable } from '@/app/_ui/data-table';
import { StateMark } from '@/app/_ui/state-mark';
import { signalSentence } from '@/lib/excursions/signal-sentence';
import type { CaseSignal, ExcursionCase } from '@/lib/excursions/types';
import { formatDateTime } from '@/lib/format';
import styles from '../../cells.module.css';
import { SubgroupLink, SubgroupWithWafers } from './subgroup-links';

/** The signals of a case: what each says, which subgroup completed it, which took part, and what became of it. */
export function SignalTable({ found, timeZone }: { found: ExcursionCase; timeZone: string }) {
  const { stream, signals } = found;
  return (
    <DataTable<CaseSignal>
      caption="Signals of this case, the newest first"
      captionUnseen
      columns={[
        {
          key: 'what',
          head: 'What happened',
          cell: (signal) =>
            signal.withdrawnAt === null ? (
              <span className={styles.words}>
                <StateMark needsPerson={found.state === 'open'}>{signalSentence(signal)}</StateMark>
              </span>
            ) : (
              <span className={styles.words}>
                <s>{signalSentence(signal)}</s>
                <br />
                <span className="small">
                  withdrawn {formatDateTime(signal.withdrawnAt, timeZone)}: {signal.withdrawnReason}
                </span>
              </span>
            ),
        },
        {
          key: 'first',
          head: 'Completed by',
          cell: (signal) => <SubgroupWithWafers stream={stream} subgroup={signal.first} />,
        },
        {
          key: 'took-part',
          head: 'Took part before it',
          cell: (signal) => {
            const before = signal.participants.filter(({ id }) => id !== signal.first.id);
            if (before.length === 0) return '—';
            return (
              <span className={styles.words}>
                {before.map((subgroup, at) => (
                  <span key={subgroup.id}>
                    {at > 0 && ', '}
                    <SubgroupLink stream={stream} subgroup={subgroup} />
                  </span>
                ))}
              </span>
            );
          },
        },
        {
          key: 'last',
          head: 'Went on to',
          cell: ({ first, last, completions }) =>
            last.id === first.id ? (
              '—'
            ) : (
              <>
                <SubgroupLink stream={stream} subgroup={last} />{' '}
                <span className="quiet small">completed {completions} times</span>
              </>
            ),
        },
        {
          key: 'limits',
          head: 'Limits',
          cell: ({ limitsRevision }) =>
            limitsRevision === null ? '—' : <span className={styles.line}>revision {limitsRevision}</span>,
        },
        {
          key: 'raised',
          head: 'Raised',
          cell: ({ raisedAt }) => <span className={styles.line}>{formatDateTime(raisedAt, timeZone)}</span>,
        },
      ]}
      rows={signals}
      rowKey={(signal) => signal.id}
      download={{ href: `/api/excursions/${found.id}/signals`, label: 'Signals as CSV' }}
    />
  );
}
