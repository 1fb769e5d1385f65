import { routeActor } from '@/app/route-actor';
import { csvResponse } from '@/lib/csv-response';
import { type BoardRow, boardRows } from '@/lib/excursions/board-rows';
import { limitWords } from '@/lib/excursions/board-state';
import { listBoardStreams } from '@/lib/excursions/data';
import { foundStreams } from '@/lib/excursions/found-streams';

const COLUMNS: readonly [string, (row: BoardRow) => string | number | Date | null][] = [
  ['stream', ({ stream }) => stream.slug],
  ['name', ({ stream }) => stream.name],
  ['tool', ({ stream }) => stream.tool],
  ['chamber', ({ stream }) => stream.chamber],
  ['diameter_mm', ({ stream }) => stream.diameterMm],
  ['group', ({ state }) => state.group],
  ['state', ({ state }) => state.words],
  ['cases_not_closed', ({ stream }) => stream.openCases],
  ['cases_unanswered', ({ stream }) => stream.unansweredCases],
  ['oldest_unanswered_at', ({ stream }) => stream.oldestUnansweredAt],
  ['newest_wafer', ({ stream }) => stream.newest?.wafer ?? null],
  ['newest_measured_at', ({ stream }) => stream.newest?.measuredAt ?? null],
  ['charted_value', ({ stream }) => stream.chartedValue],
  ['level', ({ level }) => level],
  ['level_sigma', ({ levelInSigma }) => levelInSigma],
  ['against_expected_percent', ({ expected }) => expected?.differencePercent ?? null],
  ['against_expected_dopant_percent', ({ expected }) => expected?.dopantPercent ?? null],
  ['expected_uncertainty_percent', ({ expected }) => expected?.uncertaintyPercent ?? null],
  ['evenness_percent', ({ evenness }) => evenness.nowPercent],
  ['evenness_usual_lower_percent', ({ evenness }) => evenness.usual?.lowerPercent ?? null],
  ['evenness_usual_upper_percent', ({ evenness }) => evenness.usual?.upperPercent ?? null],
  ['limits', ({ stream }) => limitWords(stream)],
  ['wafers_to_measure_again', ({ stream }) => stream.toMeasureAgain.length],
];

/** The board's rows as a file; `find` filters as on the page. */
export async function GET(request: Request): Promise<Response> {
  const actor = await routeActor(request, 'see-line');
  if (actor instanceof Response) return actor;
  const find = new URL(request.url).searchParams.get('find')?.trim().slice(0, 100) ?? '';
  const rows = boardRows(foundStreams(await listBoardStreams(actor), find));
  return csvResponse(
    'board.csv',
    COLUMNS.map(([name]) => name),
    rows.map((row) => COLUMNS.map(([, value]) => value(row))),
  );
}
