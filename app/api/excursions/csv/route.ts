import { routeActor } from '@/app/route-actor';
import { csvResponse } from '@/lib/csv-response';
import { listExcursions } from '@/lib/excursions/data';
import { excursionQuery } from '@/lib/excursions/schema';
import { signalSentence } from '@/lib/excursions/signal-sentence';

const MOST = 100_000;

/** The excursions that the page's filters ask for, all of them, as a file. */
export async function GET(request: Request): Promise<Response> {
  const actor = await routeActor(request, 'see-line');
  if (actor instanceof Response) return actor;
  const asked = Object.fromEntries(new URL(request.url).searchParams);
  const { state, stream } = excursionQuery.parse(asked);
  const { excursions } = await listExcursions(actor, { state, stream, skip: 0, most: MOST });
  return csvResponse(
    'excursions.csv',
    [
      ...['excursion', 'stream', 'stream_name', 'state', 'chart', 'family', 'side', 'signal', 'signals'],
      ...['first_subgroup', 'first_processed_at', 'last_subgroup', 'last_processed_at', 'opened_at'],
      ...['acknowledged_by', 'closed_at', 'closed_by', 'cause'],
    ],
    excursions.map((row) => [
      ...[row.id, row.stream.slug, row.stream.name, row.state, row.chart, row.family, row.side],
      ...[row.signal && signalSentence(row.signal), row.signals],
      ...[row.first.key, row.first.at, row.last.key, row.last.at, row.openedAt],
      ...[row.acknowledgedBy, row.closedAt, row.closedBy, row.cause],
    ]),
  );
}
