import { DataTable } from '@/app/_ui/data-table';
import { subgroupLabel, type SubgroupWord } from '@/lib/excursions/subgroup-label';
import { formatDateTime, formatPercent } from '@/lib/format';
import type { BeyondPoint } from './baseline-study';
import type { ChartedText } from './charted-text';

/** The points of a baseline that lie beyond the limits drawn from it. */
export function BeyondTable(props: {
  beyond: readonly BeyondPoint[];
  subgroup: SubgroupWord;
  text: ChartedText;
  timeZone: string;
  href: string;
}) {
  const { text } = props;
  return (
    <DataTable
      caption="Beyond the limits drawn from them"
      rows={props.beyond}
      rowKey={({ point }) => point.id}
      download={{ href: props.href, label: 'All subgroups of the span as CSV' }}
      columns={[
        { key: 'key', head: 'subgroup', cell: ({ point }) => subgroupLabel(props.subgroup, point.key) },
        { key: 'at', head: 'processed', cell: ({ point }) => formatDateTime(point.at, props.timeZone) },
        { key: 'level', head: 'level', align: 'right', cell: ({ point }) => text.level(point.level) },
        {
          key: 'range',
          head: 'moving range',
          align: 'right',
          cell: ({ movingRange }) => text.range(movingRange),
        },
        {
          key: 'within',
          head: 'within wafer',
          align: 'right',
          cell: ({ point }) => formatPercent(point.within),
        },
        {
          key: 'charts',
          head: 'beyond on',
          cell: ({ charts }) => <span className="call">◆ {charts.join(', ')}</span>,
        },
      ]}
    />
  );
}
