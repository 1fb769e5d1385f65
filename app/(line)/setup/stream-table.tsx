import Link from 'next/link';
import { DataTable, type DataColumn } from '@/app/_ui/data-table';
import type { SetupRow } from './setup-rows';

const COLUMNS: readonly DataColumn<SetupRow>[] = [
  {
    key: 'name',
    head: 'stream',
    cell: (row) => (
      <>
        <Link href={`/setup/streams/${row.slug}`}>{row.name}</Link>
        {row.retired && <span className="quiet">, out of use</span>}
      </>
    ),
  },
  { key: 'place', head: 'where', cell: (row) => row.place },
  { key: 'target', head: 'target', cell: (row) => row.target },
  { key: 'expected', head: 'expected', cell: (row) => <span className="phys">{row.expected}</span> },
  { key: 'specification', head: 'accepted', cell: (row) => row.specification },
  {
    key: 'limits',
    head: 'limits',
    cell: (row) => <Link href={`/setup/streams/${row.slug}/limits`}>{row.limits}</Link>,
  },
];

/** Every stream with what it aims at and what judges it. */
export function StreamTable({ rows }: { rows: readonly SetupRow[] }) {
  return (
    <DataTable
      caption="Streams"
      captionUnseen
      columns={COLUMNS}
      rows={rows}
      rowKey={(row) => row.slug}
      download={{ href: '/api/setup/streams', label: 'Streams as CSV' }}
    />
  );
}
