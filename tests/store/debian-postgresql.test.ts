import { execFileSync, spawn } from 'node:child_process';
import { existsSync, mkdirSync, mkdtempSync, rmSync } from 'node:fs';
import { once } from 'node:events';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { closeClients, getPool, openClients } from '@/lib/database/client';
import { applyMigrations } from '@/lib/database/migration-runner';
import { postgresUser } from '@/lib/database/postgres-user';
import { freePort } from '../support/free-port';

const bin = '/usr/lib/postgresql/15/bin';

/** The oldest PostgreSQL that is supported, as Debian packages it. */
describe.skipIf(!existsSync(`${bin}/postgres`))('PostgreSQL 15', () => {
  const folder = mkdtempSync(path.join(tmpdir(), 'evenohm-fifteen-'));
  let url = '';
  let server: ReturnType<typeof spawn>;

  beforeAll(async () => {
    const { prefix, uid, gid } = postgresUser(folder);
    const as = uid === undefined || gid === undefined ? {} : { uid, gid };
    const cluster = path.join(folder, 'cluster');
    const run = (program: string, words: string[]) => {
      const [first = '', ...rest] = [...prefix, `${bin}/${program}`, ...words];
      return [first, rest] as const;
    };
    mkdirSync(cluster);
    const [initdb, initWords] = run('initdb', [
      '-D',
      cluster,
      '-U',
      'evenohm',
      '-A',
      'trust',
      '-E',
      'UTF8',
      '--locale=C',
    ]);
    execFileSync(initdb, initWords, { stdio: 'pipe', ...as });
    const port = await freePort();
    const words = ['-D', cluster, '-p', String(port), '-c', 'listen_addresses=127.0.0.1', '-c', 'fsync=off'];
    const [postgres, serverWords] = run('postgres', [...words, '-c', 'unix_socket_directories=']);
    server = spawn(postgres, serverWords, { stdio: 'ignore', ...as });
    url = `postgresql://evenohm@127.0.0.1:${port}/postgres`;
  });

  afterAll(async () => {
    await closeClients();
    server.kill('SIGINT');
    await once(server, 'exit');
    rmSync(folder, { recursive: true, force: true });
  });

  it('takes every migration', async () => {
    expect((await migratedWhenUp(url)).length).toBeGreaterThan(0);
    openClients(url);
    const { rows } = await getPool().query(
      `select current_setting('server_version_num')::int / 10000 as major`,
    );
    expect(rows).toEqual([{ major: 15 }]);
  });
});

/** Migrates as soon as the server takes connections. */
async function migratedWhenUp(url: string): Promise<string[]> {
  for (;;) {
    try {
      return await applyMigrations(url);
    } catch (error) {
      const { code } = error as { code?: string };
      if (code !== 'ECONNREFUSED' && code !== '57P03') throw error;
      await sleep(100);
    }
  }
}
