import { routeActor } from '@/app/route-actor';
import { csvResponse } from '@/lib/csv-response';
import { listMeasureAgain } from '@/lib/excursions/data';
import { measureAgainQuery } from '@/lib/excursions/schema';

const MOST = 100_000;

/** Every wafer that waits to be measured again, as a file; `stream` asks for one stream's. */
export async function GET(request: Request): Promise<Response> {
  const actor = await routeActor(request, 'see-line');
  if (actor instanceof Response) return actor;
  const { stream } = measureAgainQuery.parse(Object.fromEntries(new URL(request.url).searchParams));
  const { wafers } = await listMeasureAgain(actor, { stream, skip: 0, most: MOST });
  return csvResponse(
    'measure-again.csv',
    [
      ...['wafer', 'run_or_lot', 'stream', 'stream_name', 'measured_at', 'gauge'],
      ...['good_sites', 'counted_sites', 'not_judged_reason'],
    ],
    wafers.map((one) => [
      ...[one.wafer, one.runOrLot, one.stream.slug, one.stream.name, one.measuredAt, one.gauge],
      ...[one.goodSites, one.countedSites, one.reason],
    ]),
  );
}
