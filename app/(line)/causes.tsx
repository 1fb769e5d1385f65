import { Caution } from '@/app/_ui/caution';
import { DataTable } from '@/app/_ui/data-table';
import type { CauseRow } from './cause-rows';

/** What would explain a difference, with what a reading cannot say, and what comes before anyone acts on it. */
export function Causes({ rows }: { rows: readonly CauseRow[] }) {
  return (
    <>
      <p className="quiet small">
        Each alone would do; several may act at once, and one reading tells no cause from another. What is
        usual is common practice, not this line’s own.
      </p>
      <DataTable
        caption="Single causes"
        captionUnseen
        rows={rows}
        rowKey={(row) => row.cause}
        empty="Nothing that physics knows moves this value."
        columns={[
          { key: 'cause', head: 'by itself', cell: (row) => row.cause },
          { key: 'takes', head: 'it would take', align: 'right', cell: (row) => row.takes },
          { key: 'usual', head: 'usual, one s', align: 'right', cell: (row) => row.usual },
          { key: 'times', head: 'times usual', align: 'right', cell: (row) => row.times },
        ]}
      />
      <Caution />
    </>
  );
}
