import { createHash, randomUUID } from 'node:crypto';
import { existsSync, readFileSync, readdirSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import pg from 'pg';
import { AppError } from '@/lib/errors';

/** One folder under prisma/migrations. */
interface Migration {
  name: string;
  sql: string;
  checksum: string;
}

interface RecordedMigration {
  migration_name: string;
  checksum: string;
  finished_at: Date | null;
}

/** The advisory lock that Prisma's own command line takes while it migrates: we wait for it, and it for us. */
export const prismaMigrationLock = 72_707_369;

/** The table as Prisma's own command line makes it, so that `prisma migrate status` agrees with us. */
const migrationTable = `
  create table if not exists _prisma_migrations (
    id varchar(36) primary key not null,
    checksum varchar(64) not null,
    finished_at timestamptz,
    migration_name varchar(255) not null,
    logs text,
    rolled_back_at timestamptz,
    started_at timestamptz not null default now(),
    applied_steps_count integer not null default 0
  )`;

export const migrationsFolder = fileURLToPath(new URL('../../prisma/migrations/', import.meta.url));

/**
 * Brings a database to the newest migration and returns the names applied now. One transaction holds one migration
 * and its record: a failure leaves neither. Instances that start together wait for each other. Throws `AppError`
 * where a migration that landed was edited since, or is missing here, or failed half-way under another tool.
 */
export async function applyMigrations(url: string, folder = migrationsFolder): Promise<string[]> {
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  try {
    await client.query('select pg_advisory_lock($1)', [prismaMigrationLock]);
    await refuseOldOrForeign(client);
    await client.query(migrationTable);
    const recorded = await client.query<RecordedMigration>(
      'select migration_name, checksum, finished_at from _prisma_migrations where rolled_back_at is null',
    );
    const applied: string[] = [];
    for (const migration of pendingMigrations(listMigrations(folder), recorded.rows)) {
      await applyOne(client, migration);
      applied.push(migration.name);
    }
    return applied;
  } finally {
    await client.end();
  }
}

/** Those not yet recorded, in order, after checking that all that is recorded is still what lies here. */
function pendingMigrations(present: Migration[], recorded: RecordedMigration[]): Migration[] {
  const byName = new Map(present.map((migration) => [migration.name, migration]));
  for (const record of recorded) {
    const name = record.migration_name;
    if (record.finished_at === null) {
      throw new AppError('conflict', `Migration ${name} began in this database and never finished.`);
    }
    const migration = byName.get(name);
    if (migration === undefined) {
      throw new AppError(
        'conflict',
        `The database holds migration ${name}, which is missing here: it was written by a newer or another version. Nothing was changed.`,
      );
    }
    if (migration.checksum !== record.checksum) {
      throw new AppError(
        'conflict',
        `Migration ${name} was edited after it landed in this database. Put it back as it was and write a new migration. Nothing was changed.`,
      );
    }
  }
  const done = new Set(recorded.map((record) => record.migration_name));
  return present.filter((migration) => !done.has(migration.name));
}

async function applyOne(client: pg.Client, migration: Migration): Promise<void> {
  try {
    await client.query('begin');
    await client.query(migration.sql);
    await client.query(
      `insert into _prisma_migrations (id, checksum, migration_name, finished_at, applied_steps_count)
       values ($1, $2, $3, clock_timestamp(), 1)`,
      [randomUUID(), migration.checksum, migration.name],
    );
    await client.query('commit');
  } catch (error) {
    await client.query('rollback').catch(() => undefined);
    const reason = error instanceof Error ? error.message : String(error);
    throw new AppError('internal', `Migration ${migration.name} failed and was undone: ${reason}`, {
      cause: error,
    });
  }
}

async function refuseOldOrForeign(client: pg.Client): Promise<void> {
  const answer = await client.query<{ version: number; tables: number; ours: boolean }>(
    `select current_setting('server_version_num')::int as version,
            (select count(*)::int from pg_tables where schemaname = current_schema()) as tables,
            to_regclass('_prisma_migrations') is not null as ours`,
  );
  const { version = 0, tables = 0, ours = false } = answer.rows[0] ?? {};
  if (version < 150_000) {
    throw new AppError(
      'unavailable',
      'The database is older than PostgreSQL 15, the oldest that is supported.',
    );
  }
  if (tables > 0 && !ours) {
    throw new AppError(
      'conflict',
      'The database already holds tables of another program: give Evenohm an empty one.',
    );
  }
}

function listMigrations(folder: string): Migration[] {
  return readdirSync(folder)
    .filter((name) => existsSync(path.join(folder, name, 'migration.sql')))
    .sort()
    .map((name) => {
      const content = readFileSync(path.join(folder, name, 'migration.sql'));
      const checksum = createHash('sha256').update(content).digest('hex');
      return { name, sql: content.toString('utf8'), checksum };
    });
}
