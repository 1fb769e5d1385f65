import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { provenActor, type Actor } from '@/lib/access/actor';
import { findFourEyes } from '@/lib/access/data';
import { setFourEyes } from '@/lib/access/four-eyes';
import type { Role } from '@/lib/access/permission';
import { getPool } from '@/lib/database/client';
import { listLimitRevisions } from '@/lib/limits/data';
import { approveLimits, draftLimits } from '@/lib/limits/mutations';
import { freshDatabase, type FreshDatabase } from '../support/fresh-database';
import { actor, hour, newStream, record, wafer } from '../support/store-line';

let database: FreshDatabase;
let stream: { id: string };

/** Two people of one name: names prove nothing. */
async function person(id: string, role: Role): Promise<Actor> {
  const name = 'Robin Marsh';
  await getPool().query('INSERT INTO person (id, name, email) VALUES ($1, $2, $3)', [
    id,
    name,
    `${id}@plant.example`,
  ]);
  return provenActor({ kind: 'person', id, name, grants: [{ role, streamIds: null }] });
}

let first: Actor;
let second: Actor;
let administrator: Actor;

beforeAll(async () => {
  database = await freshDatabase();
  stream = await newStream();
  [first, second] = [await person('one', 'process-owner'), await person('two', 'process-owner')];
  administrator = await person('three', 'administrator');
  await record(Array.from({ length: 30 }, (_, i) => wafer(stream.id, i)));
});
afterAll(() => database.drop());

const approval = { reason: 'as measured', effectiveFrom: hour(40) };

async function drafted(by: Actor): Promise<string> {
  expect(await draftLimits(by, stream.id, { from: hour(0), to: hour(24) }, 'a calm span')).toEqual({
    ok: true,
  });
  const [newest] = await listLimitRevisions(actor, stream.id);
  return newest?.id ?? '';
}

describe('four eyes over limits', () => {
  it('are not asked for unless an administrator says so', async () => {
    expect(await findFourEyes(administrator)).toBe(false);
    expect(await approveLimits(first, await drafted(first), approval)).toEqual({ ok: true });
    expect(await setFourEyes(first, true)).toMatchObject({ ok: false });
    expect(await findFourEyes(administrator)).toBe(false);
  });

  it('refuse whoever drew the limits up, by who they are and not by name, and take anyone else', async () => {
    expect(await setFourEyes(administrator, true)).toMatchObject({ ok: true });
    const id = await drafted(first);
    expect(await approveLimits(first, id, approval)).toEqual({
      ok: false,
      reason: 'You drew these limits up: someone else approves them.',
    });
    expect(await approveLimits(second, id, approval)).toEqual({ ok: true });
  });

  it('are told of in the audit trail when they begin and end', async () => {
    expect(await setFourEyes(administrator, true)).toMatchObject({ ok: false });
    expect(await setFourEyes(administrator, false)).toMatchObject({ ok: true });
    const { rows } = await getPool().query(
      `SELECT actor_id, before, after FROM audit_entry WHERE action = 'changed a setting' ORDER BY id`,
    );
    expect(rows).toEqual([
      { actor_id: 'three', before: { on: false }, after: { on: true } },
      { actor_id: 'three', before: { on: true }, after: { on: false } },
    ]);
    expect(await approveLimits(first, await drafted(first), approval)).toEqual({ ok: true });
  });
});
