import { programActor } from '@/lib/access/local-actor';
import { getPool } from '@/lib/database/client';
import { takeIds } from '@/lib/database/take-ids';
import { recordMeasurements } from '@/lib/maps/record-measurements';
import { benchStreams } from '@/seed/bench-streams';
import { benchWafers } from '@/seed/bench-wafers';
import { createDemoStreams, demoMeasurement } from '@/seed/seed-demo';
import { middle, type Figure } from './figure';
import { keyedRow } from './keyed-row';
import type { ScratchServer } from './scratch-database';

const STREAMS = 10;
const BEFORE = 2000;
const ONE_BY_ONE = 600;

/**
 * One new wafer at a time by the same path as any, by turns with a bare commit of its own summary row as ready text into
 * the same keys and indexes. A commit of one number into a table without more than a key stands beside.
 */
export async function oneWaferBench(server: ScratchServer): Promise<Figure[]> {
  await server.use();
  const actor = programActor();
  const pool = getPool();
  const streams = benchStreams(STREAMS);
  const idOf = await createDemoStreams(actor, streams);
  const made = [...benchWafers(streams, BEFORE + ONE_BY_ONE, new Date('2026-05-17T06:00:00Z'), 2)];
  const measurements = made.map(({ stream, wafer }) =>
    demoMeasurement(idOf.get(stream.slug) ?? '', stream, wafer),
  );
  const batch = async () => {
    const [id = ''] = await takeIds(pool, 'intake_batch', 1);
    return { id, source: 'bench', origin: 'command', history: false, actor: actor.name } as const;
  };
  await recordMeasurements(actor, await batch(), measurements.slice(0, BEFORE));
  await pool.query(
    'CREATE TABLE bare (id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY, value float8 NOT NULL)',
  );
  const keyed = await keyedRow(pool);
  await pool.query('ANALYZE');
  const wafers: number[] = [];
  const rows: number[] = [];
  const commits: number[] = [];
  for (const measurement of measurements.slice(BEFORE)) {
    let start = performance.now();
    const [outcome] = await recordMeasurements(actor, await batch(), [measurement]);
    wafers.push(performance.now() - start);
    if (outcome?.kind !== 'recorded') throw new Error('A wafer of the bench was not recorded.');
    rows.push(await keyed.commit(outcome.waferId));
    start = performance.now();
    await pool.query({ name: 'bare', text: 'INSERT INTO bare (value) VALUES ($1)', values: [wafers.length] });
    commits.push(performance.now() - start);
  }
  const [wafer, row, commit] = [wafers, rows, commits].map((times) => middle(times.slice(100))) as [
    number,
    number,
    number,
  ];
  return [
    { name: 'bare commit of one number', value: commit, unit: 'ms' },
    { name: "bare keyed commit of the wafer's own row", value: row, unit: 'ms' },
    { name: 'one new wafer: measured, judged, stored', value: wafer, unit: 'ms' },
    { name: 'one new wafer against the bare commit of one number', value: wafer / commit, unit: '×' },
    { name: 'one new wafer against the bare commit of its row', value: wafer / row, unit: '×', atMost: 3 },
  ];
}
