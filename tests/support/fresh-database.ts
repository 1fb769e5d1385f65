import { randomBytes } from 'node:crypto';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { inject } from 'vitest';
import { keepWaitingHeads } from '@/lib/access/audit-head';
import { closeClients, openClients } from '@/lib/database/client';
import { databaseUrl, runSql } from './store-server';

/** A database of one test file. */
export interface FreshDatabase {
  url: string;
  drop(): Promise<void>;
}

/**
 * A clone of the migrated template, with `getPool` and `getPrisma` pointed at it, and a data folder of its own, until
 * `drop`.
 */
export async function freshDatabase(): Promise<FreshDatabase> {
  const database = await clonedDatabase(inject('storeTemplate'));
  const dataFolder = mkdtempSync(path.join(tmpdir(), 'evenohm-data-'));
  process.env['EVENOHM_DATA'] = dataFolder;
  openClients(database.url);
  return {
    url: database.url,
    drop: async () => {
      await closeClients();
      await database.drop();
      keepWaitingHeads();
      rmSync(dataFolder, { recursive: true });
    },
  };
}

/** A database without any table. */
export function emptyDatabase(): Promise<FreshDatabase> {
  return clonedDatabase('template0');
}

async function clonedDatabase(template: string): Promise<FreshDatabase> {
  const server = inject('storeUrl');
  const name = `test_${randomBytes(6).toString('hex')}`;
  await runSql(server, `create database ${name} template ${template}`);
  return { url: databaseUrl(server, name), drop: () => runSql(server, `drop database ${name} with (force)`) };
}
