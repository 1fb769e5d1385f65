import Link from 'next/link';
import { DataTable } from '@/app/_ui/data-table';
import { SectionHead } from '@/app/_ui/section-head';
import { StateMark } from '@/app/_ui/state-mark';
import { formatDateTime } from '@/lib/format';
import type { BatchStream } from '@/lib/maps/data';

/** What a batch brought to each stream, with the way to its charts and open cases. */
export function StreamTable(props: { batchId: string; streams: readonly BatchStream[]; timeZone: string }) {
  const time = (moment: Date) => formatDateTime(moment, props.timeZone);
  return (
    <>
      <SectionHead id="recorded">Recorded, by stream</SectionHead>
      <DataTable
        caption="Recorded, by stream"
        captionUnseen
        rows={props.streams}
        rowKey={(stream) => stream.slug}
        download={{
          href: `/api/intake/batches/${props.batchId}/streams`,
          label: 'These streams as CSV',
        }}
        columns={[
          {
            key: 'stream',
            head: 'stream',
            cell: (stream) => <Link href={`/streams/${stream.slug}`}>{stream.name}</Link>,
          },
          { key: 'wafers', head: 'maps', align: 'right', cell: (stream) => stream.wafers },
          {
            key: 'notJudged',
            head: 'to measure again',
            align: 'right',
            cell: (stream) => <StateMark needsPerson={stream.notJudged > 0}>{stream.notJudged}</StateMark>,
          },
          {
            key: 'measured',
            head: 'measured',
            cell: ({ firstMeasuredAt, lastMeasuredAt }) =>
              time(firstMeasuredAt) === time(lastMeasuredAt)
                ? time(firstMeasuredAt)
                : `${time(firstMeasuredAt)} to ${time(lastMeasuredAt)}`,
          },
          {
            key: 'excursions',
            head: 'excursions open now',
            align: 'right',
            cell: (stream) =>
              stream.openExcursions === 0 ? (
                0
              ) : (
                <StateMark needsPerson>
                  <Link href={`/excursions?stream=${stream.slug}`}>{stream.openExcursions}</Link>
                </StateMark>
              ),
          },
        ]}
      />
    </>
  );
}
