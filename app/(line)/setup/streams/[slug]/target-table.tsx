import { DataTable } from '@/app/_ui/data-table';
import { formatNumber, formatPercent } from '@/lib/format';
import type { TargetRevision } from '@/lib/streams/types';
import { effectiveWords } from '../../effective-words';
import { targetWords } from '../../words';

/** The revisions of a stream's target, newest first. */
export function TargetTable(props: { slug: string; targets: readonly TargetRevision[]; timeZone: string }) {
  return (
    <DataTable
      caption="Target revisions"
      captionUnseen
      rows={props.targets.toReversed()}
      rowKey={(row) => row.id}
      empty="None yet: nothing is expected of the stream's wafers."
      download={{ href: `/api/setup/streams/${props.slug}/targets`, label: 'Target revisions as CSV' }}
      columns={[
        { key: 'revision', head: 'revision', cell: (row) => row.revision },
        { key: 'target', head: 'target', cell: (row) => targetWords(row.target) },
        {
          key: 'calibration',
          head: 'calibration',
          cell: ({ target, calibrationWafers }) =>
            target.calibrationFactor === null
              ? '—'
              : `${formatNumber(target.calibrationFactor, 4)} ± ${formatPercent(target.calibrationPercent)}${
                  calibrationWafers === null ? '' : `, ${calibrationWafers} wafers`
                }`,
        },
        {
          key: 'from',
          head: 'in force from',
          cell: (row) => effectiveWords(row.effectiveFrom, props.timeZone),
        },
        { key: 'author', head: 'by', cell: (row) => row.author },
        { key: 'reason', head: 'why', cell: (row) => row.reason },
      ]}
    />
  );
}
