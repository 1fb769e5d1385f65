import { routeActor } from '@/app/route-actor';
import { readCsvSpan } from '@/app/(line)/streams/[slug]/csv-span';
import { csvResponse } from '@/lib/csv-response';
import { AppError, problemResponse } from '@/lib/errors';

/** The wafers of a stretch of a stream as a file; the address says which, as on the stream's page. */
export async function GET(
  request: Request,
  context: { params: Promise<{ slug: string }> },
): Promise<Response> {
  const actor = await routeActor(request, 'see-line');
  if (actor instanceof Response) return actor;
  const { slug } = await context.params;
  const span = await readCsvSpan(actor, slug, request.url);
  if (span === null) return problemResponse(new AppError('not-found', 'There is no such stream.'));
  const { unit } = span;
  return csvResponse(
    `${slug}-wafers.csv`,
    [
      ...['wafer', 'run_or_lot', 'lot', 'gauge', 'measured_at', 'recorded_at', 'history', `value_${unit}`],
      ...['within_percent', 'sites', 'bad_sites', `expected_${unit}`, 'expected_uncertainty_percent'],
      ...['ingot_fraction', 'out_of_specification', 'not_judged_reason', 'measured_before'],
    ],
    span.wafers.map((wafer) => [
      ...[wafer.wafer, wafer.runOrLot, wafer.lot, wafer.gauge, new Date(wafer.measuredAt)],
      ...[new Date(wafer.recordedAt), wafer.history, wafer.value, wafer.within, wafer.sites, wafer.badSites],
      ...[wafer.expected, wafer.expectedUncertaintyPercent, wafer.ingotFraction, wafer.outOfSpecification],
      ...[wafer.notJudgedReason, wafer.isMeasuredAgain],
    ]),
  );
}
