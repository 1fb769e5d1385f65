import { routeActor } from '@/app/route-actor';
import { csvResponse } from '@/lib/csv-response';
import { foundStreams } from '@/lib/excursions/found-streams';
import { listStreams } from '@/lib/streams/data';

/** Every stream, those out of use too, as a file; `find` filters as on the page. */
export async function GET(request: Request): Promise<Response> {
  const actor = await routeActor(request, 'see-line');
  if (actor instanceof Response) return actor;
  const find = new URL(request.url).searchParams.get('find')?.trim().slice(0, 100) ?? '';
  const streams = foundStreams(await listStreams(actor, { retired: true }), find);
  return csvResponse(
    'streams.csv',
    [
      ...['stream', 'name', 'kind', 'step', 'tool', 'chamber', 'recipe', 'quantity', 'site_plan', 'subgroup'],
      ...['subgroup_size', 'control_statistic', 'charted_value', 'retired_at'],
    ],
    streams.map((stream) => [
      ...[stream.slug, stream.name, stream.kind, stream.step, stream.tool, stream.chamber, stream.recipe],
      ...[stream.quantity, stream.plan.name, stream.subgroup, stream.subgroupSize, stream.controlStatistic],
      ...[stream.chartedValue, stream.retiredAt],
    ]),
  );
}
