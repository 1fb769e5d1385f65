import { routeActor } from '@/app/route-actor';
import { csvResponse } from '@/lib/csv-response';
import { AppError, problemResponse } from '@/lib/errors';
import { findBatch, listBatchStreams } from '@/lib/maps/data';

const COLUMNS = ['stream', 'name', 'wafers', 'not_judged', 'first_measured_at', 'last_measured_at'];

/** What a batch brought to each stream, as a file. */
export async function GET(request: Request, { params }: { params: Promise<{ id: string }> }) {
  const actor = await routeActor(request, 'see-line');
  if (actor instanceof Response) return actor;
  const batch = await findBatch(actor, (await params).id);
  if (batch === null) return problemResponse(new AppError('not-found', 'There is no such batch.'));
  const streams = await listBatchStreams(actor, batch.id);
  const rows = streams.map((one) => [
    one.slug,
    one.name,
    one.wafers,
    one.notJudged,
    one.firstMeasuredAt,
    one.lastMeasuredAt,
  ]);
  return csvResponse(`streams-of-batch-${batch.id}.csv`, COLUMNS, rows);
}
