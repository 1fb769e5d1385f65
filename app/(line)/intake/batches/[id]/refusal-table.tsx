import { DataTable } from '@/app/_ui/data-table';
import { SectionHead } from '@/app/_ui/section-head';
import { formatCount } from '@/lib/format';
import type { IntakeRefusal } from '@/lib/maps/data';

/** Why measurements of a batch were refused. */
export function RefusalTable(props: { batchId: string; refusals: readonly IntakeRefusal[] }) {
  return (
    <>
      <SectionHead id="refused" aside={formatCount(props.refusals.length)}>
        Refused
      </SectionHead>
      <DataTable
        caption="Refused"
        captionUnseen
        rows={props.refusals}
        rowKey={(refusal) => refusal.id}
        download={{
          href: `/api/intake/batches/${props.batchId}/refusals`,
          label: 'These refusals as CSV',
        }}
        columns={[
          { key: 'line', head: 'line', cell: (refusal) => refusal.line ?? 'file' },
          { key: 'column', head: 'column', cell: (refusal) => refusal.column ?? '—' },
          { key: 'wafer', head: 'wafer', cell: (refusal) => refusal.measurement ?? '—' },
          { key: 'reason', head: 'what is wrong', cell: (refusal) => refusal.reason },
        ]}
      />
    </>
  );
}
