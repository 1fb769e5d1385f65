import { routeActor } from '@/app/route-actor';
import { csvResponse } from '@/lib/csv-response';
import { AppError, problemResponse } from '@/lib/errors';
import { findBatch, listRefusals } from '@/lib/maps/data';

/** The refusals of a batch as a file. */
export async function GET(request: Request, { params }: { params: Promise<{ id: string }> }) {
  const actor = await routeActor(request, 'see-line');
  if (actor instanceof Response) return actor;
  const batch = await findBatch(actor, (await params).id);
  if (batch === null) return problemResponse(new AppError('not-found', 'There is no such batch.'));
  const refusals = await listRefusals(actor, batch.id);
  return csvResponse(
    `refusals-of-batch-${batch.id}.csv`,
    ['file', 'line', 'column', 'measurement', 'reason'],
    refusals.map(({ file, line, column, measurement, reason }) => [file, line, column, measurement, reason]),
  );
}
