import Link from 'next/link';
import { DataTable, type DataColumn } from '@/app/_ui/data-table';
import { formatDateTime } from '@/lib/format';
import type { IntakeBatch } from '@/lib/maps/data';

const ORIGIN_WORDS = {
  page: 'this page',
  command: 'command line',
  network: 'the network',
  demonstration: 'demonstration line',
};

/** The batches of the intake, newest first. */
export function BatchTable({ batches, timeZone }: { batches: readonly IntakeBatch[]; timeZone: string }) {
  const count = (key: 'recorded' | 'repeated' | 'refused', head: string): DataColumn<IntakeBatch> => ({
    key,
    head,
    align: 'right',
    cell: (batch) => batch[key],
  });
  return (
    <DataTable
      caption="Recent batches"
      captionUnseen
      rows={batches}
      rowKey={(batch) => batch.id}
      empty="No file has been recorded yet. The first one will stand here with what became of it."
      download={{ href: '/api/intake/batches', label: 'All batches as CSV' }}
      columns={[
        {
          key: 'source',
          head: 'file',
          cell: (batch) => <Link href={`/intake/batches/${batch.id}`}>{batch.source}</Link>,
        },
        {
          key: 'at',
          head: 'taken',
          cell: (batch) => formatDateTime(batch.startedAt, timeZone),
        },
        count('recorded', 'recorded'),
        count('repeated', 'repeated'),
        count('refused', 'refused'),
        {
          key: 'state',
          head: 'kind',
          cell: (batch) =>
            `${ORIGIN_WORDS[batch.origin]}${batch.history ? ', history' : ''}${
              batch.finishedAt === null ? ', not finished' : ''
            }`,
        },
        { key: 'actor', head: 'by', cell: (batch) => batch.actor },
      ]}
    />
  );
}
