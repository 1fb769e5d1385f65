import Link from 'next/link';
import type { DataColumn } from '@/app/_ui/data-table';
import { DataTable } from '@/app/_ui/data-table';
import type { WaferToMeasure } from '@/lib/excursions/types';
import { formatDateTime } from '@/lib/format';
import styles from '../cells.module.css';
import { WaferLink } from '../wafer-link';

interface Row extends WaferToMeasure {
  /** Named where the rows are of several streams. */
  stream?: { slug: string; name: string };
}

/** Wafers that were recorded, not judged, and not measured again since, each with why. */
export function MeasureAgainTable<Wafer extends Row>(props: {
  caption: string;
  captionUnseen?: boolean;
  wafers: readonly Wafer[];
  timeZone: string;
  further?: readonly DataColumn<Wafer>[];
  download?: { href: string; label: string };
}) {
  const { wafers, further = [] } = props;
  const stream: DataColumn<Wafer> = {
    key: 'stream',
    head: 'Stream',
    cell: (row) =>
      row.stream && (
        <Link href={`/streams/${row.stream.slug}`} prefetch={false}>
          {row.stream.name}
        </Link>
      ),
  };
  return (
    <DataTable
      caption={props.caption}
      captionUnseen={props.captionUnseen ?? false}
      columns={[
        { key: 'wafer', head: 'Wafer', cell: WaferLink },
        ...(wafers[0]?.stream === undefined ? [] : [stream]),
        {
          key: 'at',
          head: 'Measured',
          cell: ({ measuredAt }) => (
            <span className={styles.line}>{formatDateTime(measuredAt, props.timeZone)}</span>
          ),
        },
        { key: 'reason', head: 'Why it is not judged', cell: ({ reason }) => reason },
        ...further,
      ]}
      rows={wafers}
      rowKey={(wafer) => wafer.id}
      {...(props.download && { download: props.download })}
    />
  );
}
