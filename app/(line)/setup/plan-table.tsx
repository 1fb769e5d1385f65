import { DataTable } from '@/app/_ui/data-table';
import type { SitePlan } from '@/lib/streams/types';

/** The site plans, each with its sites as a file. */
export function PlanTable({ plans }: { plans: readonly SitePlan[] }) {
  return (
    <DataTable
      caption="Site plans"
      captionUnseen
      rows={plans}
      rowKey={(plan) => plan.id}
      empty="None yet. A site plan says where the probe reads, on wafers of which size."
      download={{ href: '/api/setup/plans', label: 'Site plans as CSV, a row per site' }}
      columns={[
        { key: 'name', head: 'plan', cell: (plan) => plan.name },
        { key: 'sites', head: 'sites', align: 'right', cell: (plan) => plan.sites.length },
        { key: 'diameter', head: 'diameter', unit: 'mm', align: 'right', cell: (plan) => plan.diameterMm },
        {
          key: 'edge',
          head: 'edge exclusion',
          unit: 'mm',
          align: 'right',
          cell: (plan) => plan.edgeExclusionMm,
        },
        { key: 'orientation', head: 'mark', cell: (plan) => plan.orientation },
      ]}
    />
  );
}
