import type { ClientBase, Pool } from 'pg';
import { columnLiterals, columnNames, columnsAsQuery, rowsAsQuery } from '@/lib/database/columnar';
import { takeIds } from '@/lib/database/take-ids';
import type { Line, LineChange, LineExcursion, LineSignal } from './line';
import { POINT_COLUMNS } from './line-rows';
import { ENTRY_COLUMNS, EXCURSION_COLUMNS, LIMIT_COLUMNS, SIGNAL_COLUMNS } from './judgement-rows';

/** A judged line and what judging changed in it. */
export interface JudgedLine {
  line: Line;
  change: LineChange;
}

/** Whether a judgement is plain: nothing but its own points to write. */
export function isPlain({ change }: JudgedLine): boolean {
  return change.limits === null && change.signals.length === 0 && change.excursions.length === 0;
}

/** Gives every new limit revision, case and signal its id, so that all rows can name each other before any is written. */
export async function withIds(pool: Pool, judged: readonly JudgedLine[], client: ClientBase): Promise<void> {
  const excursions = judged.flatMap(({ change }) =>
    change.excursions.filter((excursion) => excursion.id === null),
  );
  const signals = judged.flatMap(({ change }) => change.signals.filter((signal) => signal.id === null));
  const limits = judged.flatMap(({ change }) => change.limits ?? []);
  await assign(pool, client, 'excursion', excursions);
  await assign(pool, client, 'signal', signals);
  await assign(pool, client, 'limit_revision', limits);
}

/** Text of a statement that writes points, new or changed, from parameters numbered from `first` on (`pointLiterals`). */
export function pointsStatement(first: number, guard = ''): string {
  return `INSERT INTO subgroup (${columnNames(POINT_COLUMNS)})
    SELECT given.* FROM ${columnsAsQuery(POINT_COLUMNS, first)} given ${guard}
    ON CONFLICT (stream_id, id) DO UPDATE SET ${POINT_COLUMNS.slice(3)
      .map(({ name }) => `${name} = excluded.${name}`)
      .join(', ')}`;
}

/** The parameters of `pointsStatement`. */
export function pointLiterals(judged: readonly JudgedLine[]): (string | Buffer)[] {
  const rows = judged.flatMap(({ line, change }) =>
    change.points.map((point) => ({ streamId: line.streamId, point })),
  );
  return columnLiterals(POINT_COLUMNS, rows);
}

/**
 * Writes what judging found beyond its points: first limits, cases and their log, signals. Within a transaction; `at`
 * is when it was found.
 */
export async function writeFindings(
  client: ClientBase,
  judged: readonly JudgedLine[],
  author: string,
  at: Date,
): Promise<void> {
  const limits = judged.flatMap(({ line, change }) =>
    change.limits === null ? [] : [{ streamId: line.streamId, limits: change.limits, author, at }],
  );
  const excursions = judged.flatMap(({ line, change }) =>
    change.excursions.map((excursion) => ({ streamId: line.streamId, excursion, at })),
  );
  const entries = excursions.flatMap(({ streamId, excursion }) =>
    excursion.entries.map((entry) => ({ streamId, excursion, entry, author, at })),
  );
  const signals = judged.flatMap(({ line, change }) =>
    change.signals.map((signal) => ({ streamId: line.streamId, signal, at })),
  );
  await insert(client, 'limit_revision', LIMIT_COLUMNS, limits, '');
  await insert(
    client,
    'excursion',
    EXCURSION_COLUMNS,
    excursions,
    'ON CONFLICT (stream_id, id) DO UPDATE SET last_subgroup_id = excluded.last_subgroup_id',
  );
  await insert(client, 'excursion_entry', ENTRY_COLUMNS, entries, '');
  await insert(
    client,
    'signal',
    SIGNAL_COLUMNS,
    signals,
    `ON CONFLICT (stream_id, chart, rule, side, first_subgroup_id) DO UPDATE SET ${[
      'participant_ids',
      'last_subgroup_id',
      'completions',
      'limit_revision_id',
      'withdrawn_reason',
    ]
      .map((name) => `${name} = excluded.${name}`)
      .join(', ')}, excursion_id = coalesce(excluded.excursion_id, signal.excursion_id),
      withdrawn_at = CASE WHEN excluded.withdrawn_reason IS NULL THEN NULL ELSE coalesce(signal.withdrawn_at, excluded.withdrawn_at) END`,
  );
  for (const { excursion } of excursions) excursion.entries = [];
}

async function insert<Row>(
  client: ClientBase,
  table: string,
  columns: Parameters<typeof rowsAsQuery<Row>>[0],
  rows: readonly Row[],
  conflict: string,
): Promise<void> {
  if (rows.length === 0) return;
  const parameters: unknown[] = [];
  const given = rowsAsQuery(columns, rows, parameters);
  await client.query(
    `INSERT INTO ${table} (${columnNames(columns)}) SELECT given.* FROM ${given} given ${conflict}`,
    parameters,
  );
}

async function assign(
  pool: Pool,
  client: ClientBase,
  table: 'excursion' | 'signal' | 'limit_revision',
  rows: readonly (LineExcursion | LineSignal | { id: string | null })[],
): Promise<void> {
  if (rows.length === 0) return;
  const ids = await takeIds(pool, table, rows.length, client);
  rows.forEach((row, i) => (row.id = ids[i] ?? null));
}
