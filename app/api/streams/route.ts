import { listStreams } from '@/lib/streams/data';
import { routeActor } from '@/app/route-actor';

/** The streams in use, as files name them, for programs that send wafer maps or read charts. */
export async function GET(request: Request): Promise<Response> {
  const actor = await routeActor(request, 'see-line');
  if (actor instanceof Response) return actor;
  const streams = (await listStreams(actor)).map((stream) => ({
    stream: stream.slug,
    name: stream.name,
    kind: stream.kind,
    step: stream.step,
    tool: stream.tool,
    chamber: stream.chamber,
    recipe: stream.recipe,
    quantity: stream.quantity,
    subgroup: stream.subgroup,
    subgroupSize: stream.subgroupSize,
    sitePlan: stream.plan.name,
    diameterMm: stream.plan.diameterMm,
    sites: stream.plan.sites.map(({ xMm, yMm }) => [xMm, yMm]),
    chartedValue: stream.chartedValue,
  }));
  return Response.json({ streams }, { headers: { 'cache-control': 'no-store' } });
}
