import Link from 'next/link';
import { DataTable } from '@/app/_ui/data-table';
import { SectionHead } from '@/app/_ui/section-head';
import { formatDateTime } from '@/lib/format';
import styles from './stream-page.module.css';
import type { StreamView } from './stream-view';

/** Wafers of the stretch that were recorded but not judged, and not measured again since; nothing when there are none. */
export function MeasureAgain({ view }: { view: StreamView }) {
  if (view.toMeasure.length === 0) return null;
  return (
    <section>
      <SectionHead id="measure-again">To be measured again</SectionHead>
      <DataTable
        caption="Wafers of this stretch that were recorded, not judged"
        captionUnseen
        rows={view.toMeasure}
        rowKey={(wafer) => wafer.id}
        columns={[
          {
            key: 'wafer',
            head: 'Wafer',
            cell: ({ id, wafer, runOrLot }) => (
              <span className={styles.nowrap}>
                <Link href={`/wafers/${id}`} prefetch={false}>
                  {wafer}
                </Link>{' '}
                <span className="quiet">{runOrLot}</span>
              </span>
            ),
          },
          {
            key: 'at',
            head: 'Measured',
            cell: ({ measuredAt }) => (
              <span className={styles.nowrap}>{formatDateTime(measuredAt, view.timeZone)}</span>
            ),
          },
          { key: 'reason', head: 'Why it is not judged', cell: ({ reason }) => reason },
        ]}
      />
    </section>
  );
}
