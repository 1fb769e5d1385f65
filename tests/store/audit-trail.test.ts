import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { commandActor } from '@/lib/access/local-actor';
import { audited } from '@/lib/access/audited';
import { headFile, keepWaitingHeads, readHead } from '@/lib/access/audit-head';
import { getPool } from '@/lib/database/client';
import { freshDatabase, type FreshDatabase } from '../support/fresh-database';

let database: FreshDatabase;
beforeAll(async () => {
  database = await freshDatabase();
});
afterAll(() => database.drop());

const actor = commandActor();
const telling = { action: 'changed a setting', subject: { kind: 'setting', id: 'four-eyes' } } as const;

const entries = async () => (await getPool().query('SELECT * FROM audit_entry ORDER BY id')).rows;

describe('the audit trail', () => {
  test('tells of a change in the transaction of the change', async () => {
    await audited(actor, async (client, tell) => {
      await client.query(`INSERT INTO plant_setting (key, value) VALUES ('four-eyes', 'true')`);
      tell({ ...telling, before: { on: false }, after: { on: true }, why: 'two look at limits\0\ud800' });
      tell({ ...telling, why: `quotes " ' \\ and {braces}` });
    });
    expect(await entries()).toMatchObject([
      {
        id: '1',
        actor_kind: 'command',
        actor_name: actor.name,
        action: 'changed a setting',
        after: { on: true },
        why: 'two look at limits\ufffd\ufffd',
      },
      { id: '2', why: `quotes " ' \\ and {braces}`, before: null },
    ]);
  });

  test('tells of nothing that was undone', async () => {
    const undone = audited(actor, async (client, tell) => {
      tell(telling);
      await client.query('DELETE FROM plant_setting');
      throw new Error('undone');
    });
    await expect(undone).rejects.toThrow('undone');
    expect(await entries()).toHaveLength(2);
    expect((await getPool().query('SELECT FROM plant_setting')).rowCount).toBe(1);
  });

  test('keeps its end outside the database', async () => {
    const { rows } = await getPool().query<{ name: string }>('SELECT name FROM audit_chain');
    keepWaitingHeads();
    const head = readHead(headFile(rows[0]?.name ?? ''));
    const last = (await entries()).at(-1);
    expect(head).toMatchObject({ id: 2, mac: last?.mac });
  });

  test.each([
    'UPDATE audit_entry SET why = NULL',
    'DELETE FROM audit_entry',
    'TRUNCATE audit_entry',
    'UPDATE audit_chain SET name = gen_random_uuid()',
    'DELETE FROM audit_chain',
    'TRUNCATE audit_chain',
  ])('the database refuses %s', async (sql) => {
    await expect(getPool().query(sql)).rejects.toThrow(/are never changed or deleted/);
  });

  test('takes an entry at its end only', async () => {
    const copy = (id: number) =>
      getPool().query(
        `INSERT INTO audit_entry SELECT $1, at, actor_kind, actor_id, actor_name, action, subject_kind, subject_id,
           stream_id, before, after, why, mac FROM audit_entry WHERE id = 1`,
        [id],
      );
    await expect(copy(2)).rejects.toThrow('the audit chain has moved on');
    await expect(copy(4)).rejects.toThrow('the audit chain has moved on');
  });
});
