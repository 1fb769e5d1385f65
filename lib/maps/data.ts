import type { Actor } from '@/lib/access/actor';
import { getPool, getPrisma } from '@/lib/database/client';
import type { Prisma } from '@/lib/database/generated/client';
import type { ExpectedWafer } from '@/lib/physics/target';
import type { Stream } from '@/lib/streams/types';
import { expectedWafer } from './measured-wafer';
import type { Origin } from './types';
import { waferOnRecord, type WaferOnRecord } from './wafer-on-record';

/** One taking of a file: who, when, from where, and what became of its measurements. */
export interface IntakeBatch {
  id: string;
  source: string;
  origin: Origin;
  history: boolean;
  actor: string;
  startedAt: Date;
  /** Null while it is being recorded, or where that was cut short. */
  finishedAt: Date | null;
  recorded: number;
  repeated: number;
  refused: number;
}

/** The latest batches, newest first; `before` goes on where an earlier page ended. */
export async function listBatches(
  _actor: Actor,
  options: { before?: string | null; most: number },
): Promise<IntakeBatch[]> {
  const rows = await getPrisma().intakeBatch.findMany({
    where: options.before ? { id: { lt: BigInt(options.before) } } : {},
    orderBy: { id: 'desc' },
    take: options.most,
  });
  return rows.map(batchOf);
}

export async function findBatch(_actor: Actor, id: string): Promise<IntakeBatch | null> {
  if (!/^\d{1,18}$/.test(id)) return null;
  const row = await getPrisma().intakeBatch.findUnique({ where: { id: BigInt(id) } });
  return row === null ? null : batchOf(row);
}

/** Why a measurement, or a whole file, was not recorded. */
export interface IntakeRefusal {
  id: string;
  file: string;
  line: number | null;
  column: string | null;
  measurement: string | null;
  reason: string;
}

export async function listRefusals(_actor: Actor, batchId: string): Promise<IntakeRefusal[]> {
  const rows = await getPrisma().intakeRefusal.findMany({
    where: { batchId: BigInt(batchId) },
    orderBy: [{ line: { sort: 'asc', nulls: 'first' } }, { id: 'asc' }],
  });
  return rows.map(({ id, file, line, columnName, measurement, reason }) => ({
    id: id.toString(),
    file,
    line,
    column: columnName,
    measurement,
    reason,
  }));
}

/** What a batch brought to one stream. */
export interface BatchStream {
  slug: string;
  name: string;
  wafers: number;
  notJudged: number;
  firstMeasuredAt: Date;
  lastMeasuredAt: Date;
  /** Open cases of the stream now, whatever raised them. */
  openExcursions: number;
}

export async function listBatchStreams(_actor: Actor, batchId: string): Promise<BatchStream[]> {
  const { rows } = await getPool().query<BatchStream>(
    `SELECT s.slug, s.name, count(*)::integer AS wafers, count(w.not_judged_reason)::integer AS "notJudged",
       min(w.measured_at) AS "firstMeasuredAt", max(w.measured_at) AS "lastMeasuredAt",
       (SELECT count(*)::integer FROM excursion e WHERE e.stream_id = s.id AND e.state <> 'closed') AS "openExcursions"
     FROM wafer_measurement w JOIN stream s ON s.id = w.stream_id
     WHERE w.batch_id = $1 GROUP BY s.id ORDER BY s.name`,
    [batchId],
  );
  return rows;
}

const LATEST_WAFERS = 25;

/** What each of the latest judged wafers of a stream brings to its expected value. */
export async function listLatestWafers(_actor: Actor, stream: Stream): Promise<ExpectedWafer[]> {
  const { rows } = await getPool().query<{ ingotFraction: number | null; thicknessUm: number | null }>(
    `SELECT w.ingot_fraction AS "ingotFraction", w.thickness_um AS "thicknessUm"
     FROM (SELECT unnest(wafer_ids) AS id FROM
       (SELECT wafer_ids FROM subgroup WHERE stream_id = $1 AND state = 'judged'
        ORDER BY position_at DESC, key DESC LIMIT ${LATEST_WAFERS}) latest) member
     JOIN wafer_measurement w ON w.stream_id = $1 AND w.id = member.id
     WHERE w.level IS NOT NULL ORDER BY w.processed_at DESC, w.id DESC LIMIT ${LATEST_WAFERS}`,
    [stream.id],
  );
  return rows.map((facts) => expectedWafer(stream, facts));
}

/** One measured wafer with its surroundings: its page. Null where there is none by this id, or it is no id. */
export async function findWafer(actor: Actor, id: string): Promise<WaferOnRecord | null> {
  return /^\d{1,18}$/.test(id) ? waferOnRecord(actor, getPool(), id) : null;
}

function batchOf(row: Prisma.IntakeBatchGetPayload<object>): IntakeBatch {
  const { id, source, origin, history, actor, startedAt, finishedAt, recorded, repeated, refused } = row;
  return {
    id: id.toString(),
    source,
    origin: origin as Origin,
    history,
    actor,
    startedAt,
    finishedAt,
    recorded,
    repeated,
    refused,
  };
}
