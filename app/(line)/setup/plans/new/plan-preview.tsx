import { SiteMap } from '@/app/_charts/site-map';
import type { SitePlan } from '@/lib/streams/types';

/** The sites of a plan as it stands now, drawn, or what keeps it from being one. */
export function PlanPreview({ plan, fault }: { plan: Omit<SitePlan, 'id'> | null; fault: string | null }) {
  if (plan === null) return <p aria-live="polite">No plan yet: {fault}</p>;
  const quality = plan.diameterMm / 2 - plan.edgeExclusionMm;
  const outside = plan.sites.filter(({ xMm, yMm }) => Math.hypot(xMm, yMm) > quality * (1 + 1e-6)).length;
  return (
    <div>
      <p aria-live="polite">
        {plan.sites.length} {plan.sites.length === 1 ? 'site' : 'sites'}
        {outside > 0 && `, ${outside} of them in the edge exclusion`}
        {plan.sites.length < 25 && <span className="quiet">. Under 25, outliers cannot be told apart.</span>}
      </p>
      <SiteMap
        sites={plan.sites}
        diameterMm={plan.diameterMm}
        edgeExclusionMm={plan.edgeExclusionMm}
        orientation={plan.orientation}
      />
    </div>
  );
}
