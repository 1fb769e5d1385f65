import { DataTable } from '@/app/_ui/data-table';
import { SectionHead } from '@/app/_ui/section-head';
import { formatCount } from '@/lib/format';
import type { MapProblem } from '@/lib/maps/types';

/** Every problem of a file with its line and column, as many as are kept. */
export function ProblemTable(props: { problems: readonly MapProblem[]; count: number; href: string }) {
  const { problems, count } = props;
  const shown = problems.length < count ? `the first ${formatCount(problems.length)} of ` : '';
  const rows = problems.map((problem, at) => ({ ...problem, at }));
  return (
    <>
      <SectionHead id="problems" aside={`${shown}${formatCount(count)}`}>
        Problems
      </SectionHead>
      <DataTable
        caption="Problems"
        captionUnseen
        rows={rows}
        rowKey={(row) => String(row.at)}
        download={{ href: props.href, label: 'These problems as CSV' }}
        columns={[
          { key: 'line', head: 'line', cell: (row) => row.line ?? 'file' },
          { key: 'column', head: 'column', cell: (row) => row.column ?? '—' },
          { key: 'wafer', head: 'wafer', cell: (row) => row.measurement ?? '—' },
          { key: 'reason', head: 'what is wrong', cell: (row) => row.reason },
        ]}
      />
    </>
  );
}
