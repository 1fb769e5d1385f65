import Link from 'next/link';
import { DataTable } from '@/app/_ui/data-table';
import { SectionHead } from '@/app/_ui/section-head';
import type { BoardRow } from '@/lib/excursions/board-rows';
import { formatDateTime } from '@/lib/format';
import { carried } from './board-row-props';

/** Wafers that were recorded but not judged, and not measured again since; nothing when there are none. */
export function MeasureAgain({ rows, timeZone }: { rows: readonly BoardRow[]; timeZone: string }) {
  const wafers = rows.flatMap(({ stream }) => stream.toMeasureAgain.map((wafer) => ({ ...wafer, stream })));
  if (wafers.length === 0) return null;
  return (
    <section aria-labelledby="measure-again">
      <SectionHead id="measure-again">Recorded, not judged: measure again</SectionHead>
      <DataTable
        caption="Wafers to measure again, among the last 30 subgroups of each stream"
        columns={[
          {
            key: 'wafer',
            head: 'Wafer',
            cell: (wafer) => (
              <Link href={`/wafers/${wafer.id}`} prefetch={false}>
                {carried(wafer)}
              </Link>
            ),
          },
          {
            key: 'stream',
            head: 'Stream',
            cell: ({ stream }) => (
              <Link href={`/streams/${stream.slug}`} prefetch={false}>
                {stream.name}
              </Link>
            ),
          },
          { key: 'at', head: 'Measured', cell: ({ measuredAt }) => formatDateTime(measuredAt, timeZone) },
          { key: 'reason', head: 'Why it is not judged', cell: ({ reason }) => reason },
        ]}
        rows={wafers}
        rowKey={(wafer) => wafer.id}
      />
    </section>
  );
}
