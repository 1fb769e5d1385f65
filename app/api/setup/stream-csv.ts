import { routeActor } from '@/app/route-actor';
import type { Actor } from '@/lib/access/actor';
import { csvResponse, type CsvCell } from '@/lib/csv-response';
import { AppError, problemResponse } from '@/lib/errors';
import { findStreamSettings } from '@/lib/streams/data';
import type { StreamSettings } from '@/lib/streams/types';

/** A route that gives some rows of one stream as a file. */
export function streamCsv<const Columns extends readonly string[]>(
  what: string,
  columns: Columns,
  rowsOf: (
    actor: Actor,
    settings: StreamSettings,
    query: URLSearchParams,
  ) => Promise<CsvCell[][]> | CsvCell[][],
) {
  return async (request: Request, { params }: { params: Promise<{ slug: string }> }): Promise<Response> => {
    const actor = await routeActor(request, 'see-line');
    if (actor instanceof Response) return actor;
    const settings = await findStreamSettings(actor, (await params).slug.slice(0, 200));
    if (settings === null) return problemResponse(new AppError('not-found', 'There is no such stream.'));
    try {
      const rows = await rowsOf(actor, settings, new URL(request.url).searchParams);
      return csvResponse(`${settings.stream.slug}-${what}.csv`, columns, rows);
    } catch (error) {
      return problemResponse(error);
    }
  };
}
