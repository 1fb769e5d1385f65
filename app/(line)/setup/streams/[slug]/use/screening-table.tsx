import { DataTable } from '@/app/_ui/data-table';
import { formatDateTime } from '@/lib/format';
import type { ScreeningChange } from '@/lib/streams/types';
import { SCREEN_WORDS } from '../../../words';

/** The changes of a stream's screening, newest first. */
export function ScreeningTable(props: { changes: readonly ScreeningChange[]; timeZone: string }) {
  return (
    <DataTable
      caption="Changes of the screening"
      captionUnseen
      rows={props.changes.toReversed()}
      rowKey={({ at, screening }) => `${at.getTime()} ${screening}`}
      columns={[
        {
          key: 'at',
          head: 'for wafers processed after',
          cell: ({ at }) => formatDateTime(at, props.timeZone),
        },
        { key: 'screening', head: 'screening', cell: (row) => SCREEN_WORDS[row.screening] },
        { key: 'former', head: 'before', cell: (row) => SCREEN_WORDS[row.former] },
        { key: 'author', head: 'by', cell: (row) => row.author },
        { key: 'reason', head: 'why', cell: (row) => row.reason },
      ]}
    />
  );
}
