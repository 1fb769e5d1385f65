import { copyFileSync, rmSync } from 'node:fs';
import path from 'node:path';
import { afterAll, beforeAll, beforeEach, describe, expect, test, vi } from 'vitest';
import { commandActor } from '@/lib/access/local-actor';
import { audited } from '@/lib/access/audited';
import { headFile, keepWaitingHeads, readHead } from '@/lib/access/audit-head';
import { verifyAudit } from '@/lib/access/verify-audit';
import { getPool } from '@/lib/database/client';
import { freshDatabase, type FreshDatabase } from '../support/fresh-database';

const ENTRIES = 30;

let database: FreshDatabase;
let head = '';
beforeAll(async () => {
  database = await freshDatabase();
  for (let i = 1; i <= ENTRIES; i += 1) {
    await audited(commandActor(), async (_, tell) => {
      tell({
        action: 'closed a case',
        subject: { kind: 'excursion', id: String(i) },
        why: `cause ${i}`,
        after: { i },
      });
    });
  }
  const { rows } = await getPool().query<{ name: string }>('SELECT name FROM audit_chain');
  head = headFile(rows[0]?.name ?? '');
  keepWaitingHeads();
  copyFileSync(head, `${head}.copy`);
  await getPool().query('CREATE TABLE untouched AS SELECT * FROM audit_entry');
});
afterAll(() => database.drop());

/** What only the owner of the database can do: with the triggers off. */
async function asOwner(sql: string): Promise<void> {
  await getPool().query(
    `ALTER TABLE audit_entry DISABLE TRIGGER USER; ${sql}; ALTER TABLE audit_entry ENABLE TRIGGER USER`,
  );
}

beforeEach(async () => {
  copyFileSync(`${head}.copy`, head);
  await asOwner('DELETE FROM audit_entry; INSERT INTO audit_entry SELECT * FROM untouched');
});

const broken = async () => (await verifyAudit()).broken;

describe('verifying the audit trail', () => {
  test('finds nothing where nothing was touched', async () => {
    expect(await verifyAudit()).toEqual({ entries: ENTRIES, heads: 1, strangers: [], broken: [] });
  });

  test.each([
    `at = at + interval '1 ms'`,
    `actor_kind = 'program'`,
    `actor_name = 'someone else'`,
    `action = 'acknowledged a case'`,
    `subject_kind = 'wafer'`,
    `subject_id = '99'`,
    `stream_id = 1`,
    `before = '{}'`,
    `after = '{"i":8}'`,
    `after = '{"i": 7}'`,
    `after = NULL`,
    `why = 'chance'`,
    `why = NULL`,
  ])('names the entry in which someone set %s', async (change) => {
    await asOwner(`UPDATE audit_entry SET ${change} WHERE id = 7`);
    expect(await broken()).toEqual([{ from: 7, to: 7, fault: 'altered' }]);
  });

  test('names an edited entry and its successor where the mac was changed too', async () => {
    await asOwner(`UPDATE audit_entry SET why = 'chance', mac = sha256('guess') WHERE id = 7`);
    expect(await broken()).toEqual([{ from: 7, to: 8, fault: 'altered' }]);
  });

  test('names what is missing in the middle', async () => {
    await asOwner('DELETE FROM audit_entry WHERE id IN (12, 13)');
    expect(await broken()).toEqual([
      { from: 12, to: 13, fault: 'missing' },
      { from: 14, to: 14, fault: 'unproven' },
    ]);
  });

  test('names what is missing at the beginning', async () => {
    await asOwner('DELETE FROM audit_entry WHERE id <= 3');
    expect(await broken()).toEqual([
      { from: 1, to: 3, fault: 'missing' },
      { from: 4, to: 4, fault: 'unproven' },
    ]);
  });

  test('names everything after a gap that was closed by new numbers', async () => {
    await asOwner(`DELETE FROM audit_entry WHERE id = 12; UPDATE audit_entry SET id = id + 1000 WHERE id > 12;
      UPDATE audit_entry SET id = id - 1001 WHERE id > 1000`);
    expect(await broken()).toEqual([
      { from: 12, to: ENTRIES - 1, fault: 'altered' },
      { from: ENTRIES, to: ENTRIES, fault: 'cut' },
    ]);
  });

  test('names both ends of a swap', async () => {
    await asOwner(`UPDATE audit_entry SET id = 1000 WHERE id = 10; UPDATE audit_entry SET id = 10 WHERE id = 20;
      UPDATE audit_entry SET id = 20 WHERE id = 1000`);
    expect(await broken()).toEqual([
      { from: 10, to: 11, fault: 'altered' },
      { from: 20, to: 21, fault: 'altered' },
    ]);
  });

  test('names a tail that was cut, by the head outside the database', async () => {
    await asOwner('DELETE FROM audit_entry WHERE id > 25');
    expect(await broken()).toEqual([{ from: 26, to: ENTRIES, fault: 'cut' }]);
  });

  test('names all where all were cut', async () => {
    await asOwner('TRUNCATE audit_entry');
    expect(await broken()).toEqual([{ from: 1, to: ENTRIES, fault: 'cut' }]);
  });

  test('names a forged entry put in the place of the last', async () => {
    await asOwner(`UPDATE audit_entry SET why = 'chance', mac = sha256('guess') WHERE id = ${ENTRIES}`);
    expect(await broken()).toEqual([
      { from: ENTRIES, to: ENTRIES, fault: 'altered' },
      { from: ENTRIES, to: ENTRIES, fault: 'replaced' },
    ]);
  });

  test('names a forged entry put in after the last', async () => {
    await asOwner(`INSERT INTO audit_entry SELECT id + 1, at, actor_kind, actor_id, actor_name, action, subject_kind,
      subject_id, stream_id, before, after, why, mac FROM audit_entry WHERE id = ${ENTRIES}`);
    expect(await broken()).toEqual([{ from: ENTRIES + 1, to: ENTRIES + 1, fault: 'altered' }]);
  });

  test('names all where they were written with another key', async () => {
    vi.stubEnv('EVENOHM_SECRET', 'another secret of thirty-two characters and more');
    expect(await broken()).toEqual([{ from: 1, to: ENTRIES, fault: 'altered' }]);
    vi.unstubAllEnvs();
  });

  test('names all where the chain was given another name', async () => {
    const rename = (name: string) =>
      getPool().query(`ALTER TABLE audit_chain DISABLE TRIGGER USER; UPDATE audit_chain SET name = ${name};
        ALTER TABLE audit_chain ENABLE TRIGGER USER`);
    const { rows } = await getPool().query<{ name: string }>('SELECT name FROM audit_chain');
    await rename('gen_random_uuid()');
    expect(await verifyAudit()).toMatchObject({
      heads: 0,
      strangers: [path.basename(head)],
      broken: [{ from: 1, to: ENTRIES, fault: 'altered' }],
    });
    await rename(`'${rows[0]?.name}'`);
  });

  test('takes a database that is ahead of the head for sound: the process may have died in between', async () => {
    await audited(commandActor(), async (_, tell) => {
      tell({ action: 'closed a case', subject: { kind: 'excursion', id: 'x' } });
    });
    keepWaitingHeads();
    expect(readHead(head)).toMatchObject({ id: ENTRIES + 1 });
    copyFileSync(`${head}.copy`, head);
    expect(await verifyAudit()).toMatchObject({ entries: ENTRIES + 1, heads: 1, broken: [] });
  });

  test('holds the chain against the heads of other instances as well', async () => {
    await asOwner('DELETE FROM audit_entry WHERE id > 25');
    rmSync(head);
    expect(await verifyAudit()).toMatchObject({ heads: 0, broken: [] });
    expect(await verifyAudit([`${head}.copy`])).toMatchObject({
      broken: [{ from: 26, to: ENTRIES, fault: 'cut' }],
    });
    await expect(verifyAudit([`${head}.none`])).rejects.toThrow('There is no head of an audit trail');
  });
});
