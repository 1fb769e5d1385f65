import { routeActor } from '@/app/route-actor';
import { csvResponse } from '@/lib/csv-response';
import { AppError, problemResponse } from '@/lib/errors';
import { STATUS_WORDS } from '@/lib/maps/bad-reason-words';
import { findWafer } from '@/lib/maps/data';
import { waferReadings } from '@/lib/maps/wafer-readings';
import { waferStudy } from '@/lib/maps/wafer-study';
import { waferTitle } from '@/lib/maps/wafer-title';

/** The readings of a wafer as a file: as sent, and at 23 °C. */
export async function GET(request: Request, { params }: { params: Promise<{ id: string }> }) {
  const actor = await routeActor(request, 'see-line');
  if (actor instanceof Response) return actor;
  const found = await findWafer(actor, (await params).id);
  if (found === null) return problemResponse(new AppError('not-found', 'There is no such wafer.'));
  const unit =
    found.settings.stream.quantity === 'resistivity' ? 'resistivity_ohm_cm' : 'sheet_resistance_ohm_sq';
  return csvResponse(
    `${waferTitle(found.wafer.facts)}-${found.wafer.id}-readings.csv`,
    [
      'site',
      'x_mm',
      'y_mm',
      `${unit}_as_sent`,
      `${unit}_at_23_c`,
      'against_mean_percent',
      'against_expected_percent',
      'state',
    ],
    waferReadings(found, waferStudy(found)).map((row) => [
      row.site,
      row.xMm,
      row.yMm,
      row.sent,
      row.value,
      row.againstMeanPercent,
      row.againstExpectedPercent,
      row.status === 'good' ? 'good' : STATUS_WORDS[row.status],
    ]),
  );
}
