import { DataTable, type DataColumn } from '@/app/_ui/data-table';
import { formatNumber, formatSignedPercent, undefinedMark } from '@/lib/format';
import { STATUS_WORDS } from '@/lib/maps/bad-reason-words';
import { waferReadings, type WaferReadingRow } from '@/lib/maps/wafer-readings';
import { formatMm } from './format-site';
import { waferHref } from './wafer-href';
import type { WaferShown } from './wafer-shown';

/** Every reading of the wafer, in the order of the site plan. */
export function ReadingTable({ shown, title }: { shown: WaferShown; title: string }) {
  const { wafer, scale, unit } = shown;
  const rows = waferReadings(shown, shown.study);
  const number = (value: number | null) =>
    value === null || !Number.isFinite(value) ? undefinedMark : formatNumber(value / scale);
  const isCorrected = rows.some((row) => row.sent !== row.value);
  const right = 'right' as const;
  const columns: DataColumn<WaferReadingRow>[] = [
    { key: 'site', head: 'Site', cell: (row) => row.site },
    { key: 'x', head: 'x', unit: 'mm', align: right, cell: (row) => formatMm(row.xMm) },
    { key: 'y', head: 'y', unit: 'mm', align: right, cell: (row) => formatMm(row.yMm) },
    { key: 'r', head: 'radius', unit: 'mm', align: right, cell: (row) => formatMm(row.radiusMm) },
    ...(isCorrected
      ? [
          {
            key: 'sent',
            head: 'as sent',
            unit,
            align: right,
            cell: (row: WaferReadingRow) => number(row.sent),
          },
        ]
      : []),
    { key: 'value', head: 'at 23 °C', unit, align: right, cell: (row) => number(row.value) },
    {
      key: 'mean',
      head: 'against the mean',
      align: right,
      cell: (row) => formatSignedPercent(row.againstMeanPercent, 2),
    },
    {
      key: 'expected',
      head: 'against expected',
      align: right,
      cell: (row) => formatSignedPercent(row.againstExpectedPercent, 2),
    },
    {
      key: 'status',
      head: 'state',
      cell: (row) => (
        <>
          {STATUS_WORDS[row.status]}
          {row.decision !== null && (
            <>
              {' · '}
              <a
                href={waferHref(wafer.id, shown.view, `${row.decision}-${row.site - 1}`)}
                aria-label={`${row.decision === 'in' ? 'put back' : 'take out'} site ${row.site}`}
              >
                {row.decision === 'in' ? 'put back…' : 'take out…'}
              </a>
            </>
          )}
        </>
      ),
    },
  ];
  return (
    <DataTable
      caption={`Readings of ${title}`}
      captionUnseen
      columns={columns}
      rows={rows}
      rowKey={(row) => String(row.site)}
      download={{ href: `/api/wafers/${wafer.id}/readings.csv`, label: 'Readings as CSV' }}
    />
  );
}
