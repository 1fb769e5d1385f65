import { programActor } from '@/lib/access/local-actor';
import { getPool } from '@/lib/database/client';
import { takeIds } from '@/lib/database/take-ids';
import { recordMeasurements } from '@/lib/maps/record-measurements';
import { benchStreams } from '@/seed/bench-streams';
import { benchWafers } from '@/seed/bench-wafers';
import { createDemoStreams, demoMeasurement } from '@/seed/seed-demo';
import { middle, type Figure } from './figure';
import type { ScratchServer } from './scratch-database';

const STREAMS = 10;
const BEFORE = 2000;
const ONE_BY_ONE = 600;

/** One new wafer at a time by the same path as any, against a bare commit of a single row, by turns in one run. */
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
  await pool.query('ANALYZE');
  const wafers: number[] = [];
  const commits: number[] = [];
  for (const measurement of measurements.slice(BEFORE)) {
    let start = performance.now();
    const [outcome] = await recordMeasurements(actor, await batch(), [measurement]);
    wafers.push(performance.now() - start);
    if (outcome?.kind !== 'recorded') throw new Error('A wafer of the bench was not recorded.');
    start = performance.now();
    await pool.query({ name: 'bare', text: 'INSERT INTO bare (value) VALUES ($1)', values: [wafers.length] });
    commits.push(performance.now() - start);
  }
  const wafer = middle(wafers.slice(100));
  const commit = middle(commits.slice(100));
  return [
    { name: 'bare commit of one row', value: commit, unit: 'ms' },
    { name: 'one new wafer: measured, judged, stored', value: wafer, unit: 'ms' },
    { name: 'one new wafer against a bare commit', value: wafer / commit, unit: '×', atMost: 3 },
  ];
}
