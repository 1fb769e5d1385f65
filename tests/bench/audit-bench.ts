import type { PoolClient } from 'pg';
import { audited } from '@/lib/access/audited';
import { programActor } from '@/lib/access/local-actor';
import { verifyAudit } from '@/lib/access/verify-audit';
import { getPool } from '@/lib/database/client';
import { takeIds } from '@/lib/database/take-ids';
import { inTransaction } from '@/lib/database/transaction';
import { recordMeasurements } from '@/lib/maps/record-measurements';
import { benchStreams } from '@/seed/bench-streams';
import { benchWafers } from '@/seed/bench-wafers';
import { createDemoStreams, demoMeasurement } from '@/seed/seed-demo';
import { middle, type Figure } from './figure';
import type { ScratchServer } from './scratch-database';

const WRITERS = 8;
const ALONE = 300;
const EACH = 60;
const ROUNDS = 5;
const WAFERS = 480;

const actor = programActor();
const telling = { action: 'recorded an event', subject: { kind: 'event', id: '1' }, streamId: '1' } as const;

/**
 * What the audit trail costs: a change of three statements with its entry against the same without, alone and by eight
 * writers at once, by turns in one run; wafers one by one, each a batch with its entry, by eight writers against one.
 * The chain lets one commit at a time: eight writers are held to what one bare writer does, who commits one at a time.
 */
export async function auditBench(server: ScratchServer): Promise<Figure[]> {
  await server.use();
  await getPool().query(
    'CREATE TABLE changed (id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY, text text)',
  );
  const bare: number[] = [];
  const told: number[] = [];
  for (let i = 0; i < ALONE; i += 1) {
    bare.push(await milliseconds(change));
    told.push(await milliseconds(toldChange));
  }
  const bareTogether: number[] = [];
  const toldTogether: number[] = [];
  for (let round = 0; round < ROUNDS; round += 1) {
    bareTogether.push(await milliseconds(() => byAll(change)));
    toldTogether.push(await milliseconds(() => byAll(toldChange)));
  }
  const perSecond = (all: readonly number[]) => (WRITERS * EACH * 1000) / middle(all);
  const wafers = await wafersPerSecond();
  let entries = 0;
  const verifying = await milliseconds(async () => {
    ({ entries } = await verifyAudit());
  });
  return [
    { name: 'change of three statements, bare', value: middle(bare), unit: 'ms' },
    { name: 'the same with its entry in the audit trail', value: middle(told), unit: 'ms' },
    { name: 'change with its entry against bare', value: middle(told) / middle(bare), unit: '×', atMost: 3 },
    { name: `${WRITERS} writers of bare changes`, value: perSecond(bareTogether), unit: 'changes/s' },
    {
      name: `${WRITERS} writers of changes with their entry`,
      value: perSecond(toldTogether),
      unit: 'changes/s',
    },
    {
      name: `${WRITERS} writers with entries against bare`,
      value: middle(bareTogether) / middle(toldTogether),
      unit: '',
    },
    {
      name: `${WRITERS} writers with entries against one bare writer`,
      value: (perSecond(toldTogether) * middle(bare)) / 1000,
      unit: '',
      atLeast: 0.5,
    },
    { name: 'wafers one by one, each a batch, by one writer', value: wafers.alone, unit: 'wafers/s' },
    { name: `the same by ${WRITERS} writers`, value: wafers.together, unit: 'wafers/s' },
    {
      name: `${WRITERS} writers of wafers against one`,
      value: wafers.together / wafers.alone,
      unit: '×',
      atLeast: 0.8,
    },
    { name: 'audit trail verified', value: (entries * 1000) / verifying, unit: 'entries/s' },
  ];
}

/** A change as a mutation makes it: look, write, write. */
async function statements(client: PoolClient): Promise<void> {
  const { rows } = await client.query<{ id: string }>('INSERT INTO changed (text) VALUES ($1) RETURNING id', [
    'before',
  ]);
  await client.query('SELECT text FROM changed WHERE id = $1 FOR UPDATE', [rows[0]?.id]);
  await client.query('UPDATE changed SET text = $2 WHERE id = $1', [rows[0]?.id, 'after']);
}

const change = () => inTransaction(statements);
const toldChange = () =>
  audited(actor, async (client, tell) => {
    await statements(client);
    tell({ ...telling, before: { text: 'before' }, after: { text: 'after' }, why: 'measured' });
  });

async function byAll(write: () => Promise<void>): Promise<void> {
  const writer = async () => {
    for (let i = 0; i < EACH; i += 1) await write();
  };
  await Promise.all(Array.from({ length: WRITERS }, writer));
}

async function wafersPerSecond(): Promise<{ alone: number; together: number }> {
  const streams = benchStreams(WRITERS);
  const idOf = await createDemoStreams(actor, streams);
  const made = [...benchWafers(streams, 3 * WAFERS, new Date('2026-05-17T06:00:00Z'), 2)];
  const measurements = made.map(({ stream, wafer }) =>
    demoMeasurement(idOf.get(stream.slug) ?? '', stream, wafer),
  );
  const record = async (own: typeof measurements) => {
    for (const one of own) {
      const [id = ''] = await takeIds(getPool(), 'intake_batch', 1);
      const batch = { id, source: 'bench', origin: 'command', history: false, actor: actor.name } as const;
      await recordMeasurements(actor, batch, [one]);
    }
  };
  await record(measurements.slice(0, WAFERS));
  const alone = await milliseconds(() => record(measurements.slice(WAFERS, 2 * WAFERS)));
  const rest = measurements.slice(2 * WAFERS);
  const together = await milliseconds(async () => {
    const own = [...idOf.values()].map((id) => rest.filter(({ streamId }) => streamId === id));
    await Promise.all(own.map(record));
  });
  return { alone: (WAFERS * 1000) / alone, together: (WAFERS * 1000) / together };
}

async function milliseconds(work: () => Promise<unknown>): Promise<number> {
  const start = performance.now();
  await work();
  return performance.now() - start;
}
