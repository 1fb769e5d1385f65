import type { Pool, PoolClient } from 'pg';
import { may, type Actor } from '@/lib/access/actor';
import { refusalOf } from '@/lib/access/refusal';
import { appendWithin } from '@/lib/access/append-within';
import { audited, type Tell } from '@/lib/access/audited';
import { getPool } from '@/lib/database/client';
import { takeIds } from '@/lib/database/take-ids';
import { AppError } from '@/lib/errors';
import { judgedLine, LineTooShort } from '@/lib/excursions/judged-line';
import { joinedMembers, placeMember } from '@/lib/excursions/joined-members';
import { isPlain, withIds, writeFindings, type JudgedLine } from '@/lib/excursions/write-judgement';
import { loadDesks, putDeskBack, reachesBackTo, takeDesk, type Desk } from './desk';
import { earlierOutcomes } from './earlier-outcomes';
import { againAmong, notCharted } from './measured-again';
import { measuredAt } from './measured-ahead';
import type { MeasuredWafer } from './measured-wafer';
import { batchTelling, recordStatement, type Batch, type Written } from './record-statement';
import type { Measurement, Outcome } from './types';
import { runOrLot, subgroupKey, type WaferRow } from './wafer-rows';

/** Why a signal that no longer holds was withdrawn, when wafers were recorded. */
const LATE = 'a wafer recorded later changed the order or the values of its points';

/**
 * Records measurements: measured, judged and written in one transaction, in the order given. Each comes out as
 * recorded, repeated (the same was there already) or refused (another content was there already).
 *
 * One wafer in order goes by a single statement that carries the version of the stream it was judged by; whatever is
 * out of the ordinary goes by a transaction that holds its streams. Throws where the actor may not record wafers of one
 * of the streams: a file that names such a stream was refused before.
 */
export async function recordMeasurements(
  actor: Actor,
  batch: Batch,
  measurements: readonly Measurement[],
): Promise<Outcome[]> {
  if (!measurements.every(({ streamId }) => may(actor, 'record-maps', streamId))) {
    throw new AppError('forbidden', refusalOf('record-maps', actor.kind));
  }
  const pool = getPool();
  const only = measurements.length === 1 ? measurements[0] : undefined;
  if (only !== undefined) {
    const outcome = await recordedAlone(pool, actor, batch, only);
    if (outcome !== null) return [outcome];
  }
  return measurements.length === 0 ? [] : recordedTogether(pool, actor, batch, measurements);
}

/** The short way; null where it cannot be gone and nothing was written. */
async function recordedAlone(
  pool: Pool,
  actor: Actor,
  batch: Batch,
  measurement: Measurement,
): Promise<Outcome | null> {
  const { streamId } = measurement;
  const at = measurement.facts.processedAt.getTime();
  const desk = takeDesk(pool, streamId) ?? (await loadDesks(actor, pool, [{ streamId, from: at }]))[0];
  if (desk === undefined || !reachesBackTo(desk.line, at)) return null;
  const { stream } = desk.by.settings;
  if (stream.subgroup !== 'wafer') {
    const key = subgroupKey(stream.subgroup, measurement.facts);
    const isAtHand = desk.line.points.some((point) => point.key === key);
    if (isAtHand && (await isMeasured(pool, measurement))) return null;
    if (!isAtHand && !desk.line.whole && (await isKnown(pool, streamId, [key]))) return null;
  }
  const [id = ''] = await takeIds(pool, 'wafer_measurement', 1);
  const [subgroupId = ''] = await takeIds(pool, 'subgroup', 1);
  const only = measuredAll(desk, [{ measurement, id }]);
  const work = worked(desk, actor, batch, only, { again: new Set(), changed: [] }, () => subgroupId);
  if (work === null || !isPlain(work.judged)) return null;
  try {
    const told = { actor, ...batchTelling(batch, batch.goesOn === true ? null : streamId) };
    const answer = await appendWithin(told, async (client, entries) => {
      const { rows } = await client.query<Written>(recordStatement([work.judged], work.rows, batch, entries));
      return rows[0] as Written;
    });
    if (answer?.streams !== 1) return null;
  } catch (error) {
    if (isUniqueViolation(error)) return null;
    throw error;
  }
  putDeskBack(pool, desk);
  return { kind: 'recorded', waferId: id };
}

/** The long way: holds the streams, looks what is there already, writes the rest. */
async function recordedTogether(
  pool: Pool,
  actor: Actor,
  batch: Batch,
  measurements: readonly Measurement[],
  wholeLines = false,
): Promise<Outcome[]> {
  try {
    const { outcomes, desks } = await audited(actor, (client, tell) =>
      written(pool, client, tell, actor, batch, measurements, wholeLines),
    );
    for (const desk of desks) putDeskBack(pool, desk);
    return outcomes;
  } catch (error) {
    if (!(error instanceof LineTooShort) || wholeLines) throw error;
  }
  return recordedTogether(pool, actor, batch, measurements, true);
}

async function written(
  pool: Pool,
  client: PoolClient,
  tell: Tell,
  actor: Actor,
  batch: Batch,
  measurements: readonly Measurement[],
  wholeLines: boolean,
): Promise<{ outcomes: Outcome[]; desks: Desk[] }> {
  const streamIds = [...new Set(measurements.map((measurement) => measurement.streamId))];
  const { rows: held } = await client.query<{ id: string; version: string }>(
    'SELECT id, version FROM stream WHERE id = ANY($1::bigint[]) ORDER BY id FOR UPDATE',
    [streamIds],
  );
  const outcomes = await earlierOutcomes(actor, client, measurements);
  const fresh = measurements.flatMap((measurement, index) =>
    outcomes[index] ? [] : [{ measurement, index }],
  );
  const ids = await takeIds(pool, 'wafer_measurement', fresh.length, client);
  const deskOf = await desksFor(pool, client, actor, held, fresh, wholeLines);
  const subgroupIds = await takeIds(pool, 'subgroup', fresh.length, client);
  const judged: JudgedLine[] = [];
  const rows: WaferRow[] = [];
  for (const [streamId, desk] of deskOf) {
    const own = fresh.flatMap(({ measurement, index }, place) => {
      if (measurement.streamId !== streamId) return [];
      const id = ids[place] as string;
      outcomes[index] = { kind: 'recorded', waferId: id };
      return [{ measurement, id }];
    });
    const measured = measuredAll(desk, own);
    const among = await againAmong(actor, client, desk.by, measured);
    const work = worked(desk, actor, batch, measured, among, () => subgroupIds.pop() as string);
    if (work === null) throw new LineTooShort();
    judged.push(work.judged);
    rows.push(...work.rows);
  }
  if (rows.length > 0) {
    await withIds(pool, judged, client);
    const { rows: answers } = await client.query<Written>(recordStatement(judged, rows, batch, []));
    const [answer] = answers;
    if (answer?.streams !== judged.length) throw new Error('A stream that was held moved on all the same.');
    const [streamId] = deskOf.size === 1 && batch.goesOn !== true ? deskOf.keys() : [];
    if (answer.appeared) tell(batchTelling(batch, streamId ?? null));
    await writeFindings(client, judged, actor.name, batch.at ?? new Date());
  }
  return { outcomes: outcomes as Outcome[], desks: [...deskOf.values()] };
}

interface Fresh {
  measurement: Measurement;
  id: string;
  measured: MeasuredWafer;
}

function measuredAll(desk: Desk, fresh: readonly Omit<Fresh, 'measured'>[]): Fresh[] {
  return fresh.map(({ measurement, id }) => {
    const measured = measuredAt(desk.by, measurement);
    return { measurement, id, measured };
  });
}

/** Judges the new wafers of one stream; null where its line does not reach back far enough. */
function worked(
  desk: Desk,
  actor: Actor,
  batch: Batch,
  fresh: readonly Fresh[],
  { again, changed }: Awaited<ReturnType<typeof againAmong>>,
  newId: () => string,
): { judged: JudgedLine; rows: WaferRow[] } | null {
  const { stream } = desk.by.settings;
  const additions = fresh.map(({ measurement, id, measured: { level, within, specification } }) => {
    const at = measurement.facts.processedAt.getTime();
    const key = subgroupKey(stream.subgroup, measurement.facts);
    return {
      waferId: id,
      key,
      at,
      history: batch.history,
      level,
      within,
      specification,
      isAgain: again.has(id),
    };
  });
  for (const { id, key, charted } of changed) {
    const point = desk.line.points.find((one) => one.key === key);
    if (point === undefined) return null;
    placeMember(point, id, charted);
  }
  try {
    const { touched, pointOf, from } = joinedMembers(desk.line, additions, newId);
    const change = judgedLine(desk.line, touched, from, LATE);
    const rows = fresh.map(({ measurement, id, measured }, i) => ({
      id,
      subgroupId: pointOf[i]?.id ?? '',
      batchId: batch.id,
      measurement,
      history: batch.history,
      recordedAt: batch.at ?? new Date(),
      recordedBy: actor.name,
      measured: again.has(id) ? notCharted(measured) : measured,
    }));
    return { judged: { line: desk.line, change }, rows };
  } catch (error) {
    if (error instanceof LineTooShort) return null;
    throw error;
  }
}

async function desksFor(
  pool: Pool,
  client: PoolClient,
  actor: Actor,
  held: readonly { id: string; version: string }[],
  fresh: readonly { measurement: Measurement }[],
  wholeLines: boolean,
): Promise<Map<string, Desk>> {
  const found = new Map<string, Desk>();
  const wishes: { streamId: string; from: number }[] = [];
  for (const { id, version } of held) {
    const own = fresh.flatMap(({ measurement }) => (measurement.streamId === id ? measurement.facts : []));
    if (own.length === 0) continue;
    const earliest = own.reduce((least, facts) => Math.min(least, facts.processedAt.getTime()), Infinity);
    const desk = takeDesk(pool, id);
    const kind = desk?.by.settings.stream.subgroup ?? null;
    const isReady =
      desk !== null && desk.line.version === version && reachesBackTo(desk.line, earliest) && !wholeLines;
    if (isReady && (kind === 'wafer' || desk.line.whole)) found.set(id, desk);
    else
      wishes.push({
        streamId: id,
        from: wholeLines ? -Infinity : await earliestOf(client, id, own, earliest),
      });
  }
  for (const desk of await loadDesks(actor, client, wishes)) found.set(desk.line.streamId, desk);
  return found;
}

/** The earliest position that the wafers touch: their own, or that of a subgroup they join. */
async function earliestOf(
  client: PoolClient,
  streamId: string,
  facts: readonly Measurement['facts'][],
  earliest: number,
): Promise<number> {
  const keys = [...new Set(facts.flatMap(({ run, lot }) => [run, lot].filter((key) => key !== null)))];
  if (keys.length === 0) return earliest;
  const { rows } = await client.query<{ at: Date | null }>(
    'SELECT min(position_at) AS at FROM subgroup WHERE stream_id = $1 AND key = ANY($2::text[])',
    [streamId, keys],
  );
  return Math.min(earliest, rows[0]?.at?.getTime() ?? Infinity);
}

/** Whether the wafer of a measurement is on record by any other. */
async function isMeasured(pool: Pool, { streamId, facts }: Measurement): Promise<boolean> {
  const { rowCount } = await pool.query({
    name: 'is-measured',
    text: 'SELECT FROM wafer_measurement WHERE stream_id = $1 AND run_or_lot = $2 AND wafer = $3 LIMIT 1',
    values: [streamId, runOrLot(facts), facts.wafer],
  });
  return (rowCount ?? 0) > 0;
}

async function isKnown(pool: Pool, streamId: string, keys: readonly string[]): Promise<boolean> {
  const { rowCount } = await pool.query(
    'SELECT FROM subgroup WHERE stream_id = $1 AND key = ANY($2::text[])',
    [streamId, keys],
  );
  return (rowCount ?? 0) > 0;
}

function isUniqueViolation(error: unknown): boolean {
  return error instanceof Error && 'code' in error && error.code === '23505';
}
