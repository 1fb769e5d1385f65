import { spawn, type ChildProcess } from 'node:child_process';
import { programActor } from '@/lib/access/local-actor';
import { findRequestActor } from '@/lib/access/request-actor';
import { getPool } from '@/lib/database/client';
import { takeIds } from '@/lib/database/take-ids';
import { listBoardStreams } from '@/lib/excursions/data';
import { recordMeasurements } from '@/lib/maps/record-measurements';
import type { Measurement } from '@/lib/maps/types';
import { benchStreams } from '@/seed/bench-streams';
import { benchWafers } from '@/seed/bench-wafers';
import { createDemoStreams, demoMeasurement } from '@/seed/seed-demo';
import { freePort } from '../support/free-port';
import { sessionOf } from '../support/session-of';
import { middle, type Figure } from './figure';
import type { ScratchServer } from './scratch-database';

const STREAMS = 40;
const FEW = 1_000;
const MANY = 100_000;
const ROUNDS = 60;
const END = new Date('2026-05-17T06:00:00Z');

/** An app on a database of its own, and the pages that are timed on it. */
interface TimedApp {
  process: ChildProcess;
  /** The Cookie header of someone who is signed in there. */
  cookie: string;
  pages: { empty: string; board: string; stream: string };
}

/**
 * Server time of the board with 40 streams and of a stream's page with 200 points, on few and on many stored wafers.
 * The apps answer by turns, so that whatever else the machine does falls on all of them alike.
 */
export async function pageBench(server: ScratchServer): Promise<Figure[]> {
  // As many points are drawn on few wafers: a board of 40 streams wants them spread, a stream's 200 points together.
  const spread = await timedApp(server, FEW, STREAMS);
  const together = await timedApp(server, FEW, 5);
  const many = await timedApp(server, MANY, STREAMS);
  const timedPages = {
    empty: [many, 'empty'],
    board: [many, 'board'],
    stream: [many, 'stream'],
    fewBoard: [spread, 'board'],
    fewStream: [together, 'stream'],
  } as const;
  const times = new Map<string, number[]>(Object.keys(timedPages).map((name) => [name, []]));
  const sql: number[] = [];
  const asking: number[] = [];
  const request = new Request(many.pages.board, { headers: { cookie: many.cookie } });
  try {
    for (let round = 0; round < ROUNDS; round += 1) {
      for (const [name, [app, page]] of Object.entries(timedPages)) {
        times.get(name)?.push(await timed(() => answered(app.pages[page], app.cookie)));
      }
      asking.push(await timed(() => findRequestActor(request)));
      sql.push(await timed(() => listBoardStreams(programActor())));
    }
  } finally {
    for (const app of [spread, together, many]) await stopped(app.process);
  }
  const settled = (name: keyof typeof timedPages) => middle((times.get(name) ?? []).slice(10));
  const [empty, board, stream] = [settled('empty'), settled('board'), settled('stream')];
  return [
    { name: 'an empty page of the app', value: empty, unit: 'ms' },
    { name: `board, 40 streams, ${MANY} wafers`, value: board, unit: 'ms' },
    { name: 'knowing who asks, of either', value: middle(asking.slice(10)), unit: 'ms', atMost: 1 },
    { name: 'its rows read from the database alone', value: middle(sql.slice(10)), unit: 'ms' },
    { name: `stream, 200 points, ${MANY} wafers`, value: stream, unit: 'ms' },
    { name: 'board against an empty page', value: board / empty, unit: '×', atMost: 5 },
    { name: 'stream against an empty page', value: stream / empty, unit: '×', atMost: 5 },
    {
      name: `board on ${MANY} against ${FEW} wafers`,
      value: board / settled('fewBoard'),
      unit: '×',
      atMost: 1.3,
    },
    {
      name: `stream on ${MANY} against ${FEW} wafers`,
      value: stream / settled('fewStream'),
      unit: '×',
      atMost: 1.3,
    },
  ];
}

async function timedApp(server: ScratchServer, wafers: number, busyStreams: number): Promise<TimedApp> {
  const url = await server.use();
  const streams = benchStreams(STREAMS);
  const idOf = await createDemoStreams(programActor(), streams);
  await record(wafers, benchWafers(streams.slice(0, busyStreams), wafers, END, 3), idOf);
  await getPool().query('VACUUM ANALYZE');
  const port = await freePort();
  const base = `http://127.0.0.1:${port}`;
  const from = new Date(END.getTime() - 200 * 3_600_000).toISOString();
  const stream = `${base}/streams/${streams[0]?.slug}?from=${from}&to=${END.toISOString()}`;
  return {
    cookie: await sessionOf('viewer'),
    process: await startApp(url, port),
    pages: { empty: `${base}/methods`, board: `${base}/`, stream },
  };
}

async function timed(work: () => Promise<unknown>): Promise<number> {
  const start = performance.now();
  await work();
  return performance.now() - start;
}

async function answered(address: string, cookie: string): Promise<void> {
  const answer = await fetch(address, { headers: { cookie }, redirect: 'manual' });
  await answer.text();
  if (!answer.ok) throw new Error(`${address} answered ${answer.status}.`);
}

async function stopped(app: ChildProcess): Promise<void> {
  app.kill('SIGTERM');
  await new Promise((resolve) => app.once('close', resolve));
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
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  await new Promise<void>((resolve, reject) => {
    let said = '';
    for (const stream of [app.stdout, app.stderr]) {
      stream?.on('data', (chunk: Buffer) => {
        said += chunk.toString();
        if (said.includes('Evenohm is at')) resolve();
      });
    }
    app.once('close', () => reject(new Error(`The app did not start: ${said}`)));
  });
  return app;
}
