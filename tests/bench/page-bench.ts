import { spawn, type ChildProcess } from 'node:child_process';
import { programActor } from '@/lib/access/local-actor';
import { getPool } from '@/lib/database/client';
import { takeIds } from '@/lib/database/take-ids';
import { listBoardStreams } from '@/lib/excursions/data';
import { recordMeasurements } from '@/lib/maps/record-measurements';
import type { Measurement } from '@/lib/maps/types';
import { benchStreams } from '@/seed/bench-streams';
import { benchWafers } from '@/seed/bench-wafers';
import { createDemoStreams, demoMeasurement } from '@/seed/seed-demo';
import { freePort } from '../support/free-port';
import { middle, type Figure } from './figure';
import type { ScratchServer } from './scratch-database';

const STREAMS = 40;
const FEW = 1_000;
const MANY = 100_000;
const ROUNDS = 60;

interface PageTimes {
  empty: number;
  board: number;
  stream: number;
  boardSql: number;
}

/** Server time of the board with 40 streams and of a stream's page with 200 points, on few and on many stored wafers. */
export async function pageBench(server: ScratchServer): Promise<Figure[]> {
  const few = await pageTimes(server, FEW);
  const many = await pageTimes(server, MANY);
  return [
    { name: 'an empty page of the app', value: many.empty, unit: 'ms' },
    { name: `board, 40 streams, ${MANY} wafers`, value: many.board, unit: 'ms' },
    { name: 'its rows read from the database alone', value: many.boardSql, unit: 'ms' },
    { name: `stream, 200 points, ${MANY} wafers`, value: many.stream, unit: 'ms' },
    { name: 'board against an empty page', value: many.board / many.empty, unit: '×', atMost: 5 },
    { name: 'stream against an empty page', value: many.stream / many.empty, unit: '×', atMost: 5 },
    { name: `board on ${MANY} against ${FEW} wafers`, value: many.board / few.board, unit: '×', atMost: 1.3 },
    {
      name: `stream on ${MANY} against ${FEW} wafers`,
      value: many.stream / few.stream,
      unit: '×',
      atMost: 1.3,
    },
  ];
}

async function pageTimes(server: ScratchServer, wafers: number): Promise<PageTimes> {
  const url = await server.use();
  const actor = programActor();
  // The page of one stream shows 200 points on either database: with few wafers they all lie on five streams.
  const streams = benchStreams(STREAMS);
  const idOf = await createDemoStreams(actor, streams);
  const busy = wafers === FEW ? streams.slice(0, 5) : streams;
  await record(wafers, benchWafers(busy, wafers, new Date('2026-05-17T06:00:00Z'), 3), idOf);
  await getPool().query('VACUUM ANALYZE');
  const port = await freePort();
  const app = await startApp(url, port);
  try {
    const base = `http://127.0.0.1:${port}`;
    const from = new Date(Date.UTC(2026, 4, 17, 6) - 200 * 3_600_000).toISOString();
    const stream = `${base}/streams/${streams[0]?.slug}?from=${from}&to=2026-05-17T06:00:00Z`;
    const pages = { empty: `${base}/methods`, board: `${base}/`, stream };
    const times: Record<keyof PageTimes, number[]> = { empty: [], board: [], stream: [], boardSql: [] };
    for (let round = 0; round < ROUNDS; round += 1) {
      for (const [name, address] of Object.entries(pages)) {
        const start = performance.now();
        const answer = await fetch(address);
        await answer.text();
        if (!answer.ok) throw new Error(`${address} answered ${answer.status}.`);
        times[name as keyof PageTimes].push(performance.now() - start);
      }
      const start = performance.now();
      await listBoardStreams(actor);
      times.boardSql.push(performance.now() - start);
    }
    const settled = (name: keyof PageTimes) => middle(times[name].slice(10));
    return {
      empty: settled('empty'),
      board: settled('board'),
      stream: settled('stream'),
      boardSql: settled('boardSql'),
    };
  } finally {
    app.kill('SIGTERM');
    await new Promise((resolve) => app.once('close', resolve));
  }
}

async function record(
  count: number,
  made: ReturnType<typeof benchWafers>,
  idOf: ReadonlyMap<string, string>,
): Promise<void> {
  const actor = programActor();
  const [id = ''] = await takeIds(getPool(), 'intake_batch', 1);
  const batch = { id, source: 'bench', origin: 'command', history: false, actor: actor.name } as const;
  let waiting: Measurement[] = [];
  let done = 0;
  for (const { stream, wafer } of made) {
    waiting.push(demoMeasurement(idOf.get(stream.slug) ?? '', stream, wafer));
    done += 1;
    if (waiting.length < 2000 && done < count) continue;
    await recordMeasurements(actor, batch, waiting);
    waiting = [];
  }
}

async function startApp(databaseUrl: string, port: number): Promise<ChildProcess> {
  const app = spawn(process.execPath, ['lib/command/evenohm.js', 'serve'], {
    env: { ...process.env, DATABASE_URL: databaseUrl, PORT: String(port), EVENOHM_DEMO: 'off' },
    stdio: ['ignore', 'ignore', 'pipe'],
  });
  await new Promise<void>((resolve, reject) => {
    let said = '';
    app.stderr?.on('data', (chunk: Buffer) => {
      said += chunk.toString();
      if (said.includes('Evenohm is at')) resolve();
    });
    app.once('close', () => reject(new Error(`The app did not start: ${said}`)));
  });
  return app;
}
