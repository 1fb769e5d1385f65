import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { problemOf } from '@/lib/errors';
import { getPool, getPrisma } from '@/lib/database/client';
import { openDatabase, type OpenDatabase } from '@/lib/database/connection';
import { inTransaction } from '@/lib/database/transaction';
import { findPostmaster } from '@/lib/database/postmaster';
import { stopEmbeddedServer } from '@/lib/database/embedded-server';

const folder = mkdtempSync(path.join(tmpdir(), 'evenohm-away-'));
const said: string[] = [];
let database: OpenDatabase;

beforeAll(async () => {
  const say = (text: string) => void said.push(text);
  database = await openDatabase({ say, serving: true, databaseUrl: null, dataFolder: folder });
  await getPool().query('CREATE TABLE kept (n integer PRIMARY KEY)');
}, 120_000);

afterAll(async () => {
  await database.close();
  rmSync(folder, { recursive: true, force: true });
});

const patience = { timeout: 60_000, interval: 50 };
const postmaster = () => findPostmaster(path.join(folder, 'postgres'))?.pid ?? 0;
const write = (n: number) => getPool().query('INSERT INTO kept VALUES ($1)', [n]);
const back = (): Promise<void> => vi.waitFor(() => expect(database.isAway()).toBe(false), patience);

/** Writes numbers until the server is gone, and tells which were confirmed and what the failure means over HTTP. */
async function writeUntilGone(from: number): Promise<{ confirmed: number[]; status: number }> {
  const confirmed: number[] = [];
  for (let n = from; ; n++) {
    try {
      await write(n);
      confirmed.push(n);
    } catch (error) {
      return { confirmed, status: problemOf(error).status };
    }
  }
}

const endings: [string, number, (pid: number) => Promise<void>][] = [
  ['is killed', 1, async (pid) => void process.kill(pid, 'SIGKILL')],
  ['is stopped', 1_000_000, stopEmbeddedServer],
];

describe('an embedded server that dies under a process', () => {
  it.each(endings)(
    '%s: is away with status 503, comes back by itself, and keeps what was confirmed',
    async (_, from, end) => {
      const pid = postmaster();
      const writing = writeUntilGone(from);
      await vi.waitFor(async () => {
        const { rows } = await getPool().query<{ n: number }>(
          'SELECT count(*)::integer AS n FROM kept WHERE n >= $1',
          [from],
        );
        expect(rows[0]?.n).toBeGreaterThan(20);
      }, patience);
      const open = inTransaction(async (client) => {
        await client.query('INSERT INTO kept VALUES ($1)', [-from]);
        await end(pid);
        await vi.waitFor(() => expect(database.isAway()).toBe(true), patience);
        await client.query('INSERT INTO kept VALUES ($1)', [-from - 1]);
      });
      await expect(open.catch((error: unknown) => problemOf(error).status)).resolves.toBe(503);
      const { confirmed, status } = await writing;
      expect(status).toBe(503);
      await vi.waitFor(() => expect([0, pid]).not.toContain(postmaster()), patience);
      await back();
      const { rows } = await getPool().query<{ n: number }>('SELECT n FROM kept');
      const kept = new Set(rows.map(({ n }) => n));
      expect(confirmed.length).toBeGreaterThan(20);
      expect(confirmed.filter((n) => !kept.has(n))).toEqual([]);
      expect([kept.has(-from), kept.has(-from - 1)]).toEqual([false, false]);
      await write(from - 1);
      expect(await getPrisma().$queryRaw`SELECT 1 AS one`).toEqual([{ one: 1 }]);
      expect(said.at(-1)).toBe('The database is back.');
    },
    120_000,
  );
});
