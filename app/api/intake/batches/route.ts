import { routeActor } from '@/app/route-actor';
import { csvResponse } from '@/lib/csv-response';
import { listBatches } from '@/lib/maps/data';

const COLUMNS = [
  'batch',
  'file',
  'origin',
  'history',
  'by',
  'started_at',
  'finished_at',
  'recorded',
  'repeated',
  'refused',
];

/** The latest batches as a file: every one that the pages list, up to ten thousand. */
export async function GET(request: Request): Promise<Response> {
  const actor = await routeActor(request, 'see-line');
  if (actor instanceof Response) return actor;
  const batches = await listBatches(actor, { most: 10_000 });
  const rows = batches.map((batch) => [
    batch.id,
    batch.source,
    batch.origin,
    batch.history,
    batch.actor,
    batch.startedAt,
    batch.finishedAt,
    batch.recorded,
    batch.repeated,
    batch.refused,
  ]);
  return csvResponse('intake-batches.csv', COLUMNS, rows);
}
