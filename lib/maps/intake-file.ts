import { setImmediate as nextTurn } from 'node:timers/promises';
import type { Actor } from '@/lib/access/actor';
import { audited } from '@/lib/access/audited';
import { getPool } from '@/lib/database/client';
import { columnNames, rowsAsQuery, type Column } from '@/lib/database/columnar';
import { takeIds } from '@/lib/database/take-ids';
import {
  checkFile,
  fileMeasurements,
  MOST_PROBLEMS,
  settingsBySlug,
  SpoiltFile,
  type FileCheck,
  type FileMeasurement,
  type FileSource,
} from './file-check';
import { measureAhead } from './measured-ahead';
import type { RawMap } from './raw-maps';
import { recordMeasurements } from './record-measurements';
import { batchTelling, type Batch } from './record-statement';
import { forgetContent } from './sent-content';
import { withSmallMemory } from './small-memory';
import type { IntakeResult, MapProblem, Origin } from './types';

export interface IntakeOptions {
  origin: Origin;
  /** Old wafers: recorded, shown and studied, but they open no cases. */
  history: boolean;
  /** Record the sound measurements of a file that has faults as well. */
  sound: boolean;
  /** Read and check, record nothing. */
  checkOnly?: boolean;
  /** What stands in where the file's columns say nothing. */
  defaults: RawMap['words'];
  onProgress?: (recorded: number) => void;
}

/** A transaction takes as many measurements as hold about so many readings. */
const READINGS_AT_ONCE = 100_000;

/** After so many wafers measured the batch on its way to the database gets its turn. */
const TURN_AFTER = 32;

/**
 * Takes a wafer-map file: checks it from beginning to end, then, if it is sound or the sound part is wanted, reads it
 * again and records it batch by batch. Every measurement is recorded whole or not at all, and a file that is taken
 * twice records nothing twice.
 */
export function intakeFile(actor: Actor, file: FileSource, options: IntakeOptions): Promise<IntakeResult> {
  return withSmallMemory(() => taken(actor, file, options));
}

async function taken(actor: Actor, file: FileSource, options: IntakeOptions): Promise<IntakeResult> {
  const [id = ''] = options.checkOnly ? ['0'] : await takeIds(getPool(), 'intake_batch', 1);
  const batch: Batch = {
    id,
    source: file.name,
    origin: options.origin,
    history: options.history,
    actor: actor.name,
    goesOn: true,
  };
  const result: IntakeResult = {
    batchId: null,
    recorded: 0,
    repeated: 0,
    refused: 0,
    refusals: [],
    notices: [],
  };
  try {
    const check = await checkFile(actor, file, options.defaults, 'record');
    result.notices.push(...check.notices);
    result.refusals.push(...check.problems);
    result.refused = check.faulty.size;
    if (check.problemCount > check.problems.length) {
      result.notices.push(`${check.problemCount} problems in all; the first ${MOST_PROBLEMS} are listed`);
    }
    if (options.checkOnly) {
      const fresh = check.measurements - check.faulty.size - check.repeated;
      result.notices.push(`${measurementsWord(fresh)} could be recorded`);
      return { ...result, repeated: check.repeated };
    }
    if (check.faulty.size === 0 || options.sound)
      await recordSound(actor, file, batch, check, options, result);
    else if (check.measurements > check.faulty.size) {
      const left = check.measurements - check.faulty.size;
      result.notices.push(
        `${measurementsWord(left, 'sound ')} ${left === 1 ? 'was' : 'were'} not recorded: the file has faults and only the whole was asked for`,
      );
    }
  } catch (error) {
    if (!(error instanceof SpoiltFile)) throw error;
    result.refusals.push(...error.problems);
    result.refused = Math.max(1, result.refused);
    if (options.checkOnly) return result;
  }
  await fileBatch(actor, batch, result);
  return { ...result, batchId: batch.id };
}

/**
 * Records what is sound, a batch at a time. While the database writes one batch the next is read and measured; a batch
 * begins when the one before has ended.
 */
async function recordSound(
  actor: Actor,
  file: FileSource,
  batch: Batch,
  check: FileCheck,
  options: IntakeOptions,
  result: IntakeResult,
): Promise<void> {
  let waiting: FileMeasurement[] = [];
  let readings = 0;
  let recording = Promise.resolve();
  const record = async (some: readonly FileMeasurement[]) => {
    const measurements = some.flatMap(({ found }) => (Array.isArray(found) ? [] : [found]));
    const outcomes = await recordMeasurements(actor, batch, measurements);
    measurements.forEach(forgetContent);
    outcomes.forEach((outcome, i) => {
      const { line = null, name = null } = some[i] ?? {};
      result[outcome.kind] += 1;
      if (outcome.kind !== 'refused') return;
      const { reason } = outcome;
      result.refusals.push({ file: file.name, line, column: null, measurement: name, reason });
    });
    options.onProgress?.(result.recorded + result.repeated);
  };
  const hand = async () => {
    await recording;
    recording = record(waiting);
    // Whoever waits for it next meets its failure; until then it is nobody's.
    recording.catch(() => undefined);
    waiting = [];
    readings = 0;
  };
  const take = async (one: FileMeasurement) => {
    if (check.faulty.has(one.place)) return;
    if (Array.isArray(one.found)) {
      result.refused += 1;
      result.refusals.push(...one.found);
      return;
    }
    measureAhead(getPool(), one.found);
    waiting.push(one);
    readings += one.found.readings.length;
    if (readings >= READINGS_AT_ONCE) await hand();
    else if (waiting.length % TURN_AFTER === 0) await nextTurn();
  };
  try {
    for (let i = 0; i < check.kept.length; i += 1) {
      const one = check.kept[i];
      check.kept[i] = undefined;
      if (one !== undefined) await take(one);
    }
    if (check.measurements > check.keptTo) {
      const settings = await settingsBySlug(actor);
      for await (const some of fileMeasurements(actor, file, settings, options.defaults)) {
        for (const one of some) if (one.place >= check.keptTo) await take(one);
      }
    }
    await hand();
  } finally {
    await recording;
  }
}

function measurementsWord(count: number, kind = ''): string {
  return `${count} ${kind}${count === 1 ? 'measurement' : 'measurements'}`;
}

/** Writes down what became of the file, its refusals with it. */
async function fileBatch(actor: Actor, batch: Batch, result: IntakeResult): Promise<void> {
  const listed = result.refusals
    .slice(0, MOST_PROBLEMS)
    .map((refusal) => ({ batchId: batch.id, ...refusal }));
  await audited(actor, async (client, tell) => {
    const { rows } = await client.query<{ appeared: boolean }>(
      `INSERT INTO intake_batch (id, source, origin, history, actor, repeated, refused, finished_at)
       VALUES ($1, $2, $3, $4, $5, $6, $7, now())
       ON CONFLICT (id) DO UPDATE SET repeated = excluded.repeated, refused = excluded.refused, finished_at = now()
       RETURNING xmax = 0 AS appeared`,
      [batch.id, batch.source, batch.origin, batch.history, actor.name, result.repeated, result.refused],
    );
    // A batch that appears only now has nothing recorded in it.
    if (rows[0]?.appeared) {
      const action = result.refused > 0 ? 'refused maps' : 'received maps on record';
      tell({ ...batchTelling(batch, null), action });
    }
    const parameters: unknown[] = [];
    const given = rowsAsQuery(REFUSAL_COLUMNS, listed, parameters);
    const columns = columnNames(REFUSAL_COLUMNS);
    await client.query(
      `INSERT INTO intake_refusal (${columns}) SELECT given.* FROM ${given} given`,
      parameters,
    );
  });
}

const REFUSAL_COLUMNS: readonly Column<MapProblem & { batchId: string }>[] = [
  { name: 'batch_id', type: 'bigint', value: (row) => row.batchId },
  { name: 'file', type: 'text', value: (row) => row.file },
  { name: 'line', type: 'integer', value: (row) => row.line },
  { name: 'column_name', type: 'text', value: (row) => row.column },
  { name: 'measurement', type: 'text', value: (row) => row.measurement },
  { name: 'reason', type: 'text', value: (row) => row.reason },
];
