import { routeActor } from '@/app/route-actor';
import { type CsvCell, csvResponse } from '@/lib/csv-response';
import { AppError, problemResponse } from '@/lib/errors';
import { findExcursion } from '@/lib/excursions/data';
import { signalSentence } from '@/lib/excursions/signal-sentence';
import type { ExcursionCase } from '@/lib/excursions/types';

type Table = { columns: string[]; rows: CsvCell[][] };

const TABLES: Record<string, (found: ExcursionCase) => Table> = {
  signals: ({ signals }) => ({
    columns: [
      ...[
        'signal',
        'chart',
        'rule',
        'side',
        'words',
        'completed_by',
        'completed_at',
        'took_part',
        'went_on_to',
      ],
      ...['completions', 'limits_revision', 'raised_at', 'withdrawn_at', 'withdrawn_reason'],
    ],
    rows: signals.map((signal) => [
      ...[signal.id, signal.chart, signal.rule, signal.side, signalSentence(signal)],
      ...[
        signal.first.key,
        signal.first.at,
        signal.participants.map(({ key }) => key).join(' '),
        signal.last.key,
      ],
      ...[
        signal.completions,
        signal.limitsRevision,
        signal.raisedAt,
        signal.withdrawnAt,
        signal.withdrawnReason,
      ],
    ]),
  }),
  log: ({ entries }) => ({
    columns: ['at', 'who', 'what', 'note'],
    rows: entries.map(({ at, actor, action, note }) => [at, actor, action, note]),
  }),
  subgroups: ({ points }) => ({
    columns: ['subgroup', 'processed_at', 'state', 'level', 'moving_range', 'within', 'between', 'completes'],
    rows: points.map((point) => [
      ...[point.key, point.at, point.state, point.level, point.movingRange, point.within, point.between],
      point.completions.join(' '),
    ]),
  }),
};

/** One table of an excursion's page as a file: its signals, its log, or the subgroups about it. */
export async function GET(
  request: Request,
  { params }: { params: Promise<{ id: string; table: string }> },
): Promise<Response> {
  const actor = await routeActor(request, 'see-line');
  if (actor instanceof Response) return actor;
  const { id, table } = await params;
  const make = Object.hasOwn(TABLES, table) ? TABLES[table] : undefined;
  const found = make === undefined ? null : await findExcursion(actor, id);
  if (make === undefined || found === null) {
    return problemResponse(new AppError('not-found', 'There is no such table of an excursion.'));
  }
  const { columns, rows } = make(found);
  return csvResponse(`case-${found.id}-${table}.csv`, columns, rows);
}
