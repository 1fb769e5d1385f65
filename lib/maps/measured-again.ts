import type { ClientBase } from 'pg';
import type { Actor } from '@/lib/access/actor';
import { columnNames, rowsAsQuery } from '@/lib/database/columnar';
import {
  chartedMeasurements,
  MEASURED_AGAIN,
  type MeasuredOnce,
} from '@/lib/excursions/charted-measurements';
import { type MeasuredWafer, measuredWafer, type MeasuringStream } from './measured-wafer';
import { loadStoredWafers } from './stored-wafers';
import type { Measurement } from './types';
import { MEASURED_COLUMNS, runOrLot, subgroupKey } from './wafer-rows';

/** A measurement of a wafer that may have been measured more often in its subgroup. */
export interface Sibling extends MeasuredOnce {
  id: string;
  /** The key of its subgroup. */
  key: string;
  runOrLot: string;
  wafer: string;
  /** It stands for its wafer on the charts, so far. */
  isCharted: boolean;
}

/** A measurement on record that stands otherwise now: `charted` is what goes on the charts, null where it leaves them. */
export interface ChangedSibling {
  id: string;
  key: string;
  charted: MeasuredWafer | null;
}

/** The measurements on record of the given wafers of a stream. */
export async function loadSiblings(
  _actor: Actor,
  client: ClientBase,
  streamId: string,
  wafers: readonly { runOrLot: string; wafer: string }[],
): Promise<Sibling[]> {
  const { rows } = await client.query<
    Omit<Sibling, 'measuredAt' | 'processedAt'> & { measuredAt: Date; processedAt: Date }
  >(
    `SELECT w.id, s.key, w.run_or_lot AS "runOrLot", w.wafer, w.measured_at AS "measuredAt",
       w.processed_at AS "processedAt", w.level IS NOT NULL OR w.not_judged_reason = $4 AS judgeable,
       w.id = ANY(s.wafer_ids) AS "isCharted"
     FROM (SELECT DISTINCT * FROM unnest($2::text[], $3::text[]) AS given (run_or_lot, wafer)) given
     JOIN wafer_measurement w ON w.stream_id = $1 AND w.run_or_lot = given.run_or_lot AND w.wafer = given.wafer
     JOIN subgroup s ON s.stream_id = w.stream_id AND s.id = w.subgroup_id`,
    [streamId, wafers.map(({ runOrLot }) => runOrLot), wafers.map(({ wafer }) => wafer), MEASURED_AGAIN],
  );
  return rows.map((row) => ({
    ...row,
    measuredAt: row.measuredAt.getTime(),
    processedAt: row.processedAt.getTime(),
  }));
}

/**
 * How new measurements of a stream whose subgroups hold several wafers stand beside those on record of the same wafers:
 * the ids of those that are recorded without being charted, and what changes for those on record, which is written.
 */
export async function againAmong(
  actor: Actor,
  client: ClientBase,
  by: MeasuringStream,
  fresh: readonly { id: string; measurement: Measurement; measured: MeasuredWafer }[],
): Promise<{ again: Set<string>; changed: ChangedSibling[] }> {
  const { id: streamId, subgroup } = by.settings.stream;
  if (subgroup === 'wafer') return { again: new Set(), changed: [] };
  const siblings = fresh.map(({ id, measurement: { facts }, measured }) => ({
    id,
    key: subgroupKey(subgroup, facts),
    runOrLot: runOrLot(facts),
    wafer: facts.wafer,
    measuredAt: facts.measuredAt.getTime(),
    processedAt: facts.processedAt.getTime(),
    judgeable: measured.level !== null,
    isCharted: true,
  }));
  const onRecord = await loadSiblings(actor, client, streamId, siblings);
  const changed = changedSiblings([...onRecord, ...siblings]);
  const recorded = new Set(onRecord.map(({ id }) => id));
  return {
    again: new Set(changed.flatMap(({ id }) => (recorded.has(id) ? [] : [id]))),
    changed: await writeChangedSiblings(
      actor,
      client,
      by,
      changed.filter(({ id }) => recorded.has(id)),
    ),
  };
}

/** Those of some measurements that are to stand otherwise than they do: charted from now on, or no longer. */
export function changedSiblings(siblings: readonly Sibling[]): Sibling[] {
  const groups = new Map<string, Sibling[]>();
  for (const one of siblings) {
    const name = JSON.stringify([one.key, one.runOrLot, one.wafer]);
    groups.set(name, [...(groups.get(name) ?? []), one]);
  }
  return [...groups.values()].flatMap((group) => {
    const charted = chartedMeasurements(group);
    return group.filter((one) => one.isCharted !== charted.has(one));
  });
}

/** Measures those on record that stand otherwise now again, and writes how they stand. */
export async function writeChangedSiblings(
  actor: Actor,
  client: ClientBase,
  by: MeasuringStream,
  changed: readonly Sibling[],
): Promise<ChangedSibling[]> {
  if (changed.length === 0) return [];
  const streamId = by.settings.stream.id;
  const stored = await loadStoredWafers(
    actor,
    client,
    streamId,
    changed.map(({ id }) => id),
  );
  const found: ChangedSibling[] = [];
  for (const { id, key, isCharted } of changed) {
    const one = stored.get(id);
    if (one === undefined) continue;
    const own = measuredWafer(by, one.facts, one.readings, {
      screen: one.screening,
      overrides: one.overrides,
    });
    await writeMeasured(client, streamId, id, isCharted ? notCharted(own) : own);
    found.push({ id, key, charted: isCharted ? null : own });
  }
  return found;
}

/** A wafer as it is recorded where another measurement of it is charted. */
export function notCharted(measured: MeasuredWafer): MeasuredWafer {
  return {
    ...measured,
    level: null,
    within: null,
    specification: [],
    notJudgedReason: measured.notJudgedReason ?? MEASURED_AGAIN,
  };
}

/** Writes what measuring a wafer on record again has decided. */
export async function writeMeasured(
  client: ClientBase,
  streamId: string,
  waferId: string,
  measured: MeasuredWafer,
): Promise<void> {
  const parameters: unknown[] = [streamId, waferId];
  const given = rowsAsQuery(MEASURED_COLUMNS, [{ measured }], parameters);
  await client.query(
    `UPDATE wafer_measurement SET (${columnNames(MEASURED_COLUMNS)}) = (SELECT given.* FROM ${given} given)
     WHERE stream_id = $1 AND id = $2`,
    parameters,
  );
}
