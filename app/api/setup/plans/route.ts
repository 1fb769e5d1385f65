import { routeActor } from '@/app/route-actor';
import { csvResponse } from '@/lib/csv-response';
import { listSitePlans } from '@/lib/streams/data';

const COLUMNS = ['plan', 'diameter_mm', 'edge_exclusion_mm', 'orientation', 'site', 'x_mm', 'y_mm'];

/** The sites of every plan as a file; sites count from 1. */
export async function GET(request: Request): Promise<Response> {
  const actor = await routeActor(request, 'see-line');
  if (actor instanceof Response) return actor;
  const plans = await listSitePlans(actor);
  const rows = plans.flatMap(({ name, diameterMm, edgeExclusionMm, orientation, sites }) =>
    sites.map(({ xMm, yMm }, i) => [name, diameterMm, edgeExclusionMm, orientation, i + 1, xMm, yMm]),
  );
  return csvResponse('site-plans.csv', COLUMNS, rows);
}
