import { entriesJson, type LinkedEntry, type Telling } from '@/lib/access/audit-entry';
import { columnLiterals, columnNames, columnsAsQuery } from '@/lib/database/columnar';
import { POINT_COLUMNS } from '@/lib/excursions/line-rows';
import { pointLiterals, pointsStatement, type JudgedLine } from '@/lib/excursions/write-judgement';
import type { Origin } from './types';
import { READING_COLUMNS, WAFER_COLUMNS, type WaferRow } from './wafer-rows';

/** The batch that measurements are recorded under: who sent them, from where. */
export interface Batch {
  id: string;
  source: string;
  origin: Origin;
  history: boolean;
  actor: string;
  /** More measurements of the batch may follow; whoever records them says when it is finished. */
  goesOn?: boolean;
  /** When it was recorded, where that is not now: the demonstration line has a past. */
  at?: Date;
}

/** What the statement answers. */
export interface Written {
  streams: number;
  /** Whether the batch was not there before; then the entries for the audit trail were written too. */
  appeared: boolean;
}

/** The parameters before those of points, wafers and readings: the streams as judged, and the batch. */
const OWN_PARAMETERS = 9;

const GUARD = 'JOIN moved ON moved.id = given.stream_id';
const FIRST_WAFER = OWN_PARAMETERS + POINT_COLUMNS.length + 1;
const FIRST_READING = FIRST_WAFER + WAFER_COLUMNS.length;
const ENTRIES = FIRST_READING + READING_COLUMNS.length;

/** A stream that someone else holds is passed over, not waited for: xmax is 0 in a row that was new. */
const TEXT = `WITH free AS (
    SELECT stream.id FROM unnest($1::bigint[], $2::bigint[]) AS judged (id, version)
    JOIN stream ON stream.id = judged.id AND stream.version = judged.version FOR NO KEY UPDATE OF stream SKIP LOCKED
  ), moved AS (
    UPDATE stream SET version = stream.version + 1 FROM free WHERE stream.id = free.id RETURNING stream.id
  ), filed AS (
    INSERT INTO intake_batch (id, source, origin, history, actor, recorded, finished_at)
    SELECT $3::bigint, $4::text, $5::text, $6::boolean, $7::text, $8::integer,
      CASE WHEN $9::boolean THEN NULL ELSE now() END WHERE EXISTS (SELECT FROM moved)
    ON CONFLICT (id) DO UPDATE SET recorded = intake_batch.recorded + excluded.recorded
    RETURNING xmax = 0 AS appeared
  ), placed AS (${pointsStatement(OWN_PARAMETERS + 1, GUARD)}), measured AS (
    INSERT INTO wafer_measurement (${columnNames(WAFER_COLUMNS)})
    SELECT given.* FROM ${columnsAsQuery(WAFER_COLUMNS, FIRST_WAFER)} given ${GUARD}
  ), kept AS (
    INSERT INTO wafer_reading (${columnNames(READING_COLUMNS)})
    SELECT given.* FROM ${columnsAsQuery(READING_COLUMNS, FIRST_READING)} given ${GUARD}
  ), told AS (
    INSERT INTO audit_entry SELECT given.* FROM json_populate_recordset(NULL::audit_entry, $${ENTRIES}::json) given
    WHERE (SELECT appeared FROM filed)
  ) SELECT count(*)::integer AS streams, coalesce((SELECT appeared FROM filed), false) AS appeared FROM moved`;

/**
 * One statement that writes measurements, their readings, their subgroups and their batch, if every stream still has
 * the version that was judged and nobody holds it; nothing of another stream is written. Its text is always the same,
 * so that the server plans it once.
 */
export function recordStatement(
  judged: readonly JudgedLine[],
  rows: readonly WaferRow[],
  batch: Batch,
  entries: readonly LinkedEntry[],
): { name: string; text: string; values: unknown[] } {
  const values = [
    judged.map(({ line }) => line.streamId),
    judged.map(({ line }) => line.version),
    batch.id,
    batch.source,
    batch.origin,
    batch.history,
    batch.actor,
    rows.length,
    batch.goesOn === true,
    ...pointLiterals(judged),
    ...columnLiterals(WAFER_COLUMNS, rows),
    ...columnLiterals(READING_COLUMNS, rows),
    entriesJson(entries),
  ];
  return { name: 'record', text: TEXT, values };
}

/** What is told of a batch when it appears; of one stream, where it holds no other. */
export function batchTelling(batch: Batch, streamId: string | null): Telling {
  const { id, source, origin, history } = batch;
  return {
    action: 'recorded maps',
    subject: { kind: 'batch', id },
    streamId,
    after: { source, origin, ...(history ? { history } : {}) },
  };
}
