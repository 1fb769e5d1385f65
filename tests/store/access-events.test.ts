import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { audited } from '@/lib/access/audited';
import { chainAccessEvents } from '@/lib/access/chain-access-events';
import { commandActor } from '@/lib/access/local-actor';
import { getPool } from '@/lib/database/client';
import { freshDatabase, type FreshDatabase } from '../support/fresh-database';

let database: FreshDatabase;
beforeAll(async () => {
  database = await freshDatabase();
  await getPool().query(`
    INSERT INTO person (id, name, email) VALUES ('p1', 'Ada Line', 'ada@plant.example');
    INSERT INTO account (id, person_id, provider_id, account_id, password) VALUES ('a1', 'p1', 'credential', 'p1', 'hash-one');
    INSERT INTO session (id, person_id, token, expires_at, ip_address, user_agent)
      VALUES ('s1', 'p1', 'token-one', now() + interval '1 hour', '10.0.0.7', 'a browser'),
        ('s2', 'p1', 'token-two', now() - interval '1 hour', '10.0.0.7', 'a browser');
    UPDATE session SET updated_at = now();
    UPDATE account SET password = 'hash-two', access_token = 'token-three';
    UPDATE person SET name = 'Ada Lines';
    DELETE FROM session`);
});
afterAll(() => database.drop());

const entries = async () =>
  (
    await getPool().query(
      'SELECT actor_kind, actor_id, action, subject_kind, subject_id, before, after FROM audit_entry ORDER BY id',
    )
  ).rows;

describe('what the accounts library writes by itself', () => {
  test('is taken into the chain in its order, each event once', async () => {
    expect(await chainAccessEvents()).toBe(7);
    expect(await chainAccessEvents()).toBe(0);
    const found = await entries();
    expect(found.map(({ action }) => action)).toEqual([
      'added a person',
      'added a way to sign in',
      'signed in',
      'signed in',
      'changed a password',
      'changed a person',
      'ended a session',
    ]);
    expect(found[2]).toEqual({
      actor_kind: 'person',
      actor_id: 'p1',
      action: 'signed in',
      subject_kind: 'person',
      subject_id: 'p1',
      before: null,
      after: { address: '10.0.0.7', browser: 'a browser' },
    });
    expect(found[4]).toMatchObject({ actor_kind: 'program', subject_id: 'p1' });
  });

  test('never holds a password, its hash or a token', async () => {
    const { rows } = await getPool().query('SELECT row_to_json(e)::text AS text FROM audit_entry e');
    expect(rows.map(({ text }) => text).join()).not.toMatch(/hash-|token-/);
  });

  test('is told once where a transaction tells of it itself', async () => {
    const before = (await entries()).length;
    await audited(commandActor(), async (client, tell) => {
      await client.query(`UPDATE person SET deactivated_at = now()`);
      tell({ action: 'deactivated a person', subject: { kind: 'person', id: 'p1' }, why: 'left' });
    });
    expect(await chainAccessEvents()).toBe(0);
    expect((await entries()).slice(before)).toMatchObject([{ action: 'deactivated a person' }]);
    await getPool().query('UPDATE person SET deactivated_at = NULL');
    expect(await chainAccessEvents()).toBe(1);
  });

  test('is taken in once by many who do so at the same time', async () => {
    const before = (await entries()).length;
    await getPool().query(
      `INSERT INTO session (id, person_id, token, expires_at)
       SELECT 'm' || i, 'p1', 'm' || i, now() + interval '1 hour' FROM generate_series(1, 40) i`,
    );
    const taken = await Promise.all(Array.from({ length: 6 }, () => chainAccessEvents()));
    expect(taken.reduce((sum, count) => sum + count)).toBe(40);
    expect((await entries()).length - before).toBe(40);
  });
});
