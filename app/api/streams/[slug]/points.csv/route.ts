import { routeActor } from '@/app/route-actor';
import { readCsvSpan } from '@/app/(line)/streams/[slug]/csv-span';
import { pointsCsv } from '@/app/(line)/streams/[slug]/points-csv';
import { csvResponse } from '@/lib/csv-response';
import { AppError, problemResponse } from '@/lib/errors';

/** The subgroups of a stretch of a stream as a file; the address says which, as on the stream's page. */
export async function GET(
  request: Request,
  context: { params: Promise<{ slug: string }> },
): Promise<Response> {
  const actor = await routeActor(request, 'see-line');
  if (actor instanceof Response) return actor;
  const { slug } = await context.params;
  const span = await readCsvSpan(actor, slug, request.url);
  if (span === null) return problemResponse(new AppError('not-found', 'There is no such stream.'));
  const { columns, rows } = pointsCsv(span);
  return csvResponse(`${slug}-points.csv`, columns, rows);
}
