import { randomBytes } from 'node:crypto';
import { existsSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import pg from 'pg';
import type { TestProject } from 'vitest/node';
import { generatePrismaClient } from '@/lib/database/generate.js';
import { applyMigrations } from '@/lib/database/migration-runner';
import { startEmbeddedServer, stopEmbeddedServer } from '@/lib/database/embedded-server';

declare module 'vitest' {
  export interface ProvidedContext {
    storeUrl: string;
    storeTemplate: string;
  }
}

/**
 * One real PostgreSQL for all store tests, with one migrated template database that each test file clones. It is the
 * embedded server in a folder thrown away afterwards, or that of EVENOHM_TEST_DATABASE_URL.
 */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  generatePrismaClient();
  const given = process.env.EVENOHM_TEST_DATABASE_URL;
  const folder = mkdtempSync(path.join(tmpdir(), 'evenohm-store-'));
  const server = given === undefined ? await startEmbeddedServer(folder, () => undefined) : null;
  const url = given ?? server?.url ?? '';
  const template = `template_${randomBytes(6).toString('hex')}`;
  await runSql(url, `create database ${template}`);
  await applyMigrations(databaseUrl(url, template));
  project.provide('storeUrl', url);
  project.provide('storeTemplate', template);
  return async () => {
    await runSql(url, `drop database ${template} with (force)`);
    if (server !== null) await stopEmbeddedServer(server.pid);
    if (existsSync(folder)) rmSync(folder, { recursive: true, force: true });
  };
}

export function databaseUrl(url: string, database: string): string {
  const changed = new URL(url);
  changed.pathname = `/${database}`;
  return changed.href;
}

export async function runSql(url: string, sql: string): Promise<void> {
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  try {
    await client.query(sql);
  } finally {
    await client.end();
  }
}
