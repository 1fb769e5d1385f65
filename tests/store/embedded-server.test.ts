import { spawn } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { once } from 'node:events';
import pg from 'pg';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { startEmbeddedServer, stopEmbeddedServer } from '@/lib/database/embedded-server';
import { isAlive } from '@/lib/database/postmaster';

const silent = () => undefined;
let folder: string;

beforeEach(() => {
  folder = mkdtempSync(path.join(tmpdir(), 'evenohm-embedded-'));
});

afterEach(async () => {
  const pid = serverPid();
  if (pid !== null && isAlive(pid)) await stopEmbeddedServer(pid);
  rmSync(folder, { recursive: true, force: true });
});

describe('startEmbeddedServer', () => {
  it('of several at once on a new folder starts one server that all use', async () => {
    const servers = await Promise.all([1, 2, 3].map(() => startEmbeddedServer(folder, silent)));
    expect(new Set(servers.map((server) => server.pid)).size).toBe(1);
    expect(new Set(servers.map((server) => server.url)).size).toBe(1);
  });

  it('keeps its password from everybody else and listens on loopback only', async () => {
    const { url } = await startEmbeddedServer(folder, silent);
    expect(statSync(path.join(folder, 'password')).mode & 0o777).toBe(0o600);
    expect(await ask(url, `select current_setting('listen_addresses') as v`)).toBe('127.0.0.1');
    expect(await ask(url, `select current_setting('unix_socket_directories') as v`)).toBe('');
    expect(await ask(url, `select pg_encoding_to_char(encoding) as v from pg_database limit 1`)).toBe('UTF8');
    const wrong = new URL(url);
    wrong.password = 'guess';
    await expect(ask(wrong.href, 'select 1 as v')).rejects.toThrow(/password authentication failed/);
  });

  it('adopts the server that a killed process left running', async () => {
    const left = await startInAnotherProcess();
    const adopted = await startEmbeddedServer(folder, silent);
    expect(adopted).toEqual(left);
  });

  it('recovers after the server itself was killed, with everything that was committed', async () => {
    const { url, pid } = await startEmbeddedServer(folder, silent);
    await ask(url, `create table kept as select 42 as v; select 1 as v`);
    process.kill(pid, 'SIGKILL');
    const again = await startEmbeddedServer(folder, silent);
    expect(again.url).toBe(url);
    expect(again.pid).not.toBe(pid);
    expect(await ask(again.url, 'select v from kept')).toBe(42);
  });

  it('is not fooled by a pid file whose number now belongs to another program', async () => {
    const { pid } = await startEmbeddedServer(folder, silent);
    await stopEmbeddedServer(pid);
    writeFileSync(path.join(folder, 'postgres/postmaster.pid'), `${process.pid}\n/elsewhere\n1\n5432\n`);
    const again = await startEmbeddedServer(folder, silent);
    expect(await ask(again.url, 'select 1 as v')).toBe(1);
  });
});

/** A process that opens the database, tells what it found, and is killed. */
async function startInAnotherProcess(): Promise<{ url: string; pid: number }> {
  const root = path.resolve(import.meta.dirname, '../..');
  const script = `
    import { startEmbeddedServer } from './lib/database/embedded-server';
    const server = await startEmbeddedServer(process.argv[1], () => {});
    console.log(JSON.stringify(server));
    setInterval(() => {}, 1000);`;
  const words = ['--import', 'tsx', '--input-type=module', '-e', script, folder];
  const child = spawn(process.execPath, words, { cwd: root, stdio: ['ignore', 'pipe', 'inherit'] });
  const [line] = (await once(child.stdout, 'data')) as [Buffer];
  child.kill('SIGKILL');
  await once(child, 'exit');
  return JSON.parse(line.toString()) as { url: string; pid: number };
}

function serverPid(): number | null {
  try {
    return Number(readFileSync(path.join(folder, 'postgres/postmaster.pid'), 'utf8').split('\n')[0]);
  } catch {
    return null;
  }
}

async function ask(url: string, sql: string): Promise<unknown> {
  const client = new pg.Client({ connectionString: url });
  try {
    await client.connect();
    const answer: unknown = await client.query(sql);
    const last = (Array.isArray(answer) ? answer.at(-1) : answer) as pg.QueryResult<{ v: unknown }>;
    return last.rows[0]?.v;
  } finally {
    await client.end();
  }
}
