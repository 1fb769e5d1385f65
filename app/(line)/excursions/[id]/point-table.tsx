import Link from 'next/link';
import { Beside } from '@/app/_ui/beside';
import { DataTable } from '@/app/_ui/data-table';
import { chartValue } from '@/app/_charts/chart-value';
import { subgroupLabel } from '@/lib/excursions/subgroup-label';
import type { ExcursionCase } from '@/lib/excursions/types';
import { formatDateTime } from '@/lib/format';
import { caseChartName } from './case-chart-props';
import { chartFigure } from './chart-figure';

const MOST_ROWS = 300;

/** The subgroups behind the chart of a case, as a table that opens in place. */
export function PointTable({ found, timeZone }: { found: ExcursionCase; timeZone: string }) {
  const { stream, points } = found;
  const chart = caseChartName(found);
  const held = found.signals.filter((signal) => signal.withdrawnAt === null);
  const completed = new Set(held.map((signal) => signal.first.id));
  const tookPart = new Set(held.flatMap((signal) => signal.participantIds));
  const shown = points.slice(-MOST_ROWS);
  return (
    <Beside summary={`The ${points.length} subgroups as a table`}>
      <DataTable
        caption={
          shown.length < points.length
            ? `The newest ${shown.length} of ${points.length} subgroups; the file holds all`
            : 'Subgroups about this case, in order'
        }
        columns={[
          {
            key: 'subgroup',
            head: 'Subgroup',
            cell: ({ key, firstWaferId }) =>
              firstWaferId === null ? (
                subgroupLabel(stream.subgroup, key)
              ) : (
                <Link href={`/wafers/${firstWaferId}`} prefetch={false}>
                  {subgroupLabel(stream.subgroup, key)}
                </Link>
              ),
          },
          { key: 'at', head: 'Processed', cell: ({ at }) => formatDateTime(at, timeZone) },
          {
            key: 'value',
            head: 'Charted',
            align: 'right',
            cell: (point) => chartFigure(stream, chart, chartValue(point, chart)),
          },
          {
            key: 'part',
            head: 'Part in the case',
            cell: ({ id, state }) =>
              state === 'not-judged'
                ? 'not judged'
                : completed.has(id)
                  ? 'completed a signal'
                  : tookPart.has(id)
                    ? 'took part'
                    : '—',
          },
        ]}
        rows={shown}
        rowKey={(point) => point.id}
        download={{ href: `/api/excursions/${found.id}/subgroups`, label: 'Subgroups as CSV' }}
      />
    </Beside>
  );
}
