import { randomBytes } from 'node:crypto';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { closeClients, openClients } from '@/lib/database/client';
import { startEmbeddedServer, stopEmbeddedServer } from '@/lib/database/embedded-server';
import { applyMigrations } from '@/lib/database/migration-runner';
import { databaseUrl, runSql } from '../support/store-server';

/** A server of the bench's own in a folder that is thrown away. */
export interface ScratchServer {
  /** A migrated database with `getPool` and `getPrisma` pointed at it; returns its address. */
  use(): Promise<string>;
  stop(): Promise<void>;
}

export async function scratchServer(): Promise<ScratchServer> {
  const folder = mkdtempSync(path.join(tmpdir(), 'evenohm-bench-'));
  process.env['EVENOHM_DATA'] = folder;
  process.env['EVENOHM_SECRET'] = randomBytes(24).toString('hex');
  const server = await startEmbeddedServer(folder, () => undefined);
  return {
    use: async () => {
      await closeClients();
      const name = `bench_${randomBytes(4).toString('hex')}`;
      await runSql(server.url, `create database ${name}`);
      const url = databaseUrl(server.url, name);
      await applyMigrations(url);
      openClients(url);
      return url;
    },
    stop: async () => {
      await closeClients();
      await stopEmbeddedServer(server.pid);
      rmSync(folder, { recursive: true, force: true });
    },
  };
}
