import { randomBytes } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { chainAccessEvents } from '@/lib/access/chain-access-events';
import { ensureDemonstrationPeople } from '@/lib/access/demonstration';
import { verifyAudit } from '@/lib/access/verify-audit';
import { closeClients, getPool, openClients } from '@/lib/database/client';
import { openDatabase, type OpenDatabase } from '@/lib/database/connection';
import { programBelow } from '@/lib/database/program-below';
import { stepExcursion } from '@/lib/excursions/mutations';
import { decideReading } from '@/lib/maps/mutations';
import { retireStream } from '@/lib/streams/mutations';
import { freshDatabase, type FreshDatabase } from '../support/fresh-database';
import { actor, casesOf, newStream, record, recordInTurn, settleLimits, wafer } from '../support/store-line';
import { runSql } from '../support/store-server';

const role = `program_${randomBytes(6).toString('hex')}`;
let database: FreshDatabase;
let program: OpenDatabase;
let programUrl = '';

beforeAll(async () => {
  database = await freshDatabase();
  await closeClients();
  const asProgram = new URL(database.url);
  asProgram.username = role;
  asProgram.password = 'of this test only';
  programUrl = asProgram.href;
  await runSql(database.url, `CREATE ROLE ${role} LOGIN PASSWORD 'of this test only'`);
  program = await openDatabase({ say: () => undefined, databaseUrl: programUrl, ownerUrl: database.url });
});
afterAll(async () => {
  await program.close();
  await runSql(database.url, `DROP OWNED BY ${role}; DROP ROLE ${role}`);
  openClients(database.url);
  await database.drop();
});

describe('a program whose role is not the owner of its tables', () => {
  test('does all its work', async () => {
    const { id } = await newStream();
    await settleLimits(id);
    await recordInTurn([1, 2, 3].map((i) => wafer(id, i)));
    await record([wafer(id, 4, 20), wafer(id, 5)]);
    const [opened] = await casesOf(id);
    const step = { to: 'closed', note: '', cause: 'the probe head' } as const;
    expect(await stepExcursion(actor, opened?.id ?? '', step)).toEqual({ ok: true });
    const { rows } = await getPool().query<{ id: string }>('SELECT id FROM wafer_measurement LIMIT 1');
    const decision = { siteIndex: 2, action: 'out', reason: 'a scratch' } as const;
    expect(await decideReading(actor, id, rows[0]?.id ?? '', decision)).toEqual({ ok: true });
    expect(await retireStream(actor, id, true)).toMatchObject({ ok: true });
    await ensureDemonstrationPeople();
    expect(await chainAccessEvents()).toBeGreaterThan(0);
    expect(await verifyAudit()).toMatchObject({ heads: 1, broken: [] });
  });

  test.each([
    'UPDATE audit_entry SET why = NULL',
    'DELETE FROM audit_entry',
    'TRUNCATE audit_entry',
    'ALTER TABLE audit_entry DISABLE TRIGGER USER',
    'DROP TABLE audit_entry',
    'SET session_replication_role = replica',
    'UPDATE audit_chain SET name = gen_random_uuid()',
    'INSERT INTO audit_chain DEFAULT VALUES',
    'UPDATE wafer_reading SET reading = NULL',
    'DELETE FROM wafer_reading',
    'DELETE FROM wafer_measurement',
    'DELETE FROM reading_exclusion',
    'DELETE FROM excursion_entry',
    'DELETE FROM limit_revision',
    'DELETE FROM person',
    'UPDATE target_revision SET density_per_cm3 = 1',
    'DELETE FROM _prisma_migrations',
    'CREATE TABLE own (id int)',
  ])('is not allowed to %s', async (sql) => {
    await expect(getPool().query(sql)).rejects.toThrow(/permission denied|must be owner/);
  });

  test('holds for every table that the database itself keeps from being changed', async () => {
    const { rows } = await getPool().query(
      `SELECT DISTINCT c.relname AS table FROM pg_trigger t JOIN pg_class c ON c.oid = t.tgrelid
         JOIN pg_proc p ON p.oid = t.tgfoid
       WHERE p.proname = 'refuse_change' AND (has_table_privilege(current_user, c.oid, 'UPDATE')
         OR has_table_privilege(current_user, c.oid, 'DELETE') OR has_table_privilege(current_user, c.oid, 'TRUNCATE'))`,
    );
    expect(rows).toEqual([]);
  });
});

describe('a program that could undo what it is not granted', () => {
  const HINT = 'REASSIGN OWNED BY';

  test('is told so where it signs in as the owner', async () => {
    await expect(programBelow(database.url, database.url)).rejects.toThrow(
      'give the program a role of its own',
    );
  });

  test.each([
    ['owns the database', (name: string) => `ALTER DATABASE ${name} OWNER TO ${role}`],
    ['owns a table', () => `ALTER TABLE audit_entry OWNER TO ${role}`],
    ['owns what a trigger calls', () => `ALTER FUNCTION refuse_change OWNER TO ${role}`],
  ])('is told so where it %s', async (_words, sql) => {
    const own = await freshDatabase();
    try {
      await runSql(own.url, sql(new URL(own.url).pathname.slice(1)));
      const url = new URL(own.url);
      url.username = role;
      url.password = 'of this test only';
      const opening = openDatabase({ say: () => undefined, databaseUrl: url.href, ownerUrl: own.url });
      await expect(opening).rejects.toThrow(HINT);
      await runSql(own.url, `REASSIGN OWNED BY ${role} TO CURRENT_USER`);
      expect(await programBelow(own.url, url.href)).toBe(role);
    } finally {
      await own.drop();
      openClients(programUrl);
    }
  });
});
