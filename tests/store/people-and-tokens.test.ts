import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { may, provenActor, type Actor, type Grant } from '@/lib/access/actor';
import { findPerson, listPeople, listTokens } from '@/lib/access/data';
import { addPerson, changeRoles, deactivatePerson, endSessions, invitePerson } from '@/lib/access/people';
import { findTokenActor } from '@/lib/access/token-actor';
import { makeToken, revokeToken } from '@/lib/access/tokens';
import { getPool } from '@/lib/database/client';
import { freshDatabase, type FreshDatabase } from '../support/fresh-database';
import { newStream } from '../support/store-line';

let database: FreshDatabase;
let stream: { id: string; slug: string };
let other: { id: string; slug: string };
let administrator: Actor;

const all = (role: Grant['role']): Grant => ({ role, streamIds: null });
const asPerson = (id: string, ...grants: Grant[]): Actor =>
  provenActor({ kind: 'person', id, name: `person ${id}`, grants });
const isActing = (actor: Actor | null) => actor !== null;

beforeAll(async () => {
  database = await freshDatabase();
  [stream, other] = [await newStream(), await newStream()];
  administrator = asPerson('none', all('administrator'));
  const added = await addPerson(administrator, {
    name: 'Ines Vale',
    email: 'ines@plant.example',
    grants: [all('administrator')],
  });
  if (!added.ok) throw new Error(added.reason);
  administrator = asPerson(added.value.id, all('administrator'));
});
afterAll(() => database.drop());

let people = 0;
async function added(...grants: Grant[]): Promise<string> {
  const person = { name: 'Somebody', email: `someone-${(people += 1)}@plant.example`, grants };
  const answer = await addPerson(administrator, person);
  if (!answer.ok) throw new Error(answer.reason);
  return answer.value.id;
}

async function session(personId: string): Promise<void> {
  await getPool().query(
    `INSERT INTO session (id, person_id, token, expires_at) VALUES ($1, $2, $1, now() + interval '1 hour')`,
    [`session-${Math.floor(performance.now() * 1000)}`, personId],
  );
}

async function lastTold() {
  const { rows } = await getPool().query(
    'SELECT action, subject_kind, subject_id, actor_name, before, after FROM audit_entry ORDER BY id DESC LIMIT 1',
  );
  return rows[0] as Record<string, unknown>;
}

describe('people', () => {
  it('are entered with their roles and a code, of which only a digest is kept', async () => {
    const grants = [all('viewer'), { role: 'process-owner' as const, streamIds: [stream.id] }];
    const answer = await addPerson(administrator, { name: 'Ugo', email: 'Ugo@Plant.example', grants });
    if (!answer.ok) throw new Error(answer.reason);
    const { id, code } = answer.value;
    expect(await findPerson(administrator, id)).toMatchObject({
      name: 'Ugo',
      email: 'ugo@plant.example',
      grants: expect.arrayContaining(grants),
      sessions: 0,
      signsInBy: [],
      deactivatedAt: null,
    });
    const { rows } = await getPool().query('SELECT v::text AS text FROM verification v WHERE value = $1', [
      id,
    ]);
    expect(rows).toHaveLength(1);
    expect(rows[0].text).not.toContain(code);
    expect(await lastTold()).toMatchObject({
      action: 'added a person',
      subject_id: id,
      after: { name: 'Ugo', viewer: 'all', 'process-owner': [stream.id] },
    });
    expect(await addPerson(administrator, { name: 'Ugo', email: 'ugo@plant.example', grants })).toEqual({
      ok: false,
      reason: 'There is someone with that address already.',
    });
  });

  it('are not found by an id that nobody can have', async () => {
    for (const id of ['', '\0', 'nobody', "' OR true --"]) {
      expect(await findPerson(administrator, id), JSON.stringify(id)).toBeNull();
    }
  });

  it('get roles, each for all streams or chosen ones, and lose those not named', async () => {
    const id = await added(all('viewer'), all('shift-lead'));
    const grants = [{ role: 'shift-lead' as const, streamIds: [other.id] }];
    expect(await changeRoles(administrator, id, grants)).toEqual({ ok: true, value: undefined });
    expect((await findPerson(administrator, id))?.grants).toEqual(grants);
    expect(await lastTold()).toMatchObject({
      action: 'changed roles',
      before: { viewer: 'all', 'shift-lead': 'all' },
      after: { 'shift-lead': [other.id] },
    });
    const strange = [{ role: 'shift-lead' as const, streamIds: ['999999'] }];
    expect(await changeRoles(administrator, id, strange)).toMatchObject({ ok: false });
    expect((await findPerson(administrator, id))?.grants).toEqual(grants);
  });

  it('lose their sessions and their link when they are deactivated, and are never deleted', async () => {
    const id = await added(all('viewer'));
    await session(id);
    expect((await findPerson(administrator, id))?.sessions).toBe(1);
    expect(await deactivatePerson(administrator, id, true)).toMatchObject({ ok: true });
    expect(await findPerson(administrator, id)).toMatchObject({
      sessions: 0,
      deactivatedAt: expect.any(Date),
    });
    expect((await getPool().query('SELECT FROM verification WHERE value = $1', [id])).rowCount).toBe(0);
    expect(await invitePerson(administrator, id)).toMatchObject({ ok: false });
    expect(await deactivatePerson(administrator, id, false)).toMatchObject({ ok: true });
    expect((await findPerson(administrator, id))?.deactivatedAt).toBeNull();
    expect(await invitePerson(administrator, id)).toMatchObject({ ok: true });
  });

  it('are signed out everywhere when an administrator says so', async () => {
    const id = await added(all('viewer'));
    await session(id);
    expect(await endSessions(administrator, id)).toMatchObject({ ok: true });
    expect((await findPerson(administrator, id))?.sessions).toBe(0);
    expect(await lastTold()).toMatchObject({ action: 'ended all sessions', before: { sessions: 1 } });
  });

  it('always keep an administrator, whoever asks and however many at once', async () => {
    const own = administrator.id ?? '';
    expect(await deactivatePerson(administrator, own, true)).toMatchObject({ ok: false });
    expect(await changeRoles(administrator, own, [all('viewer')])).toMatchObject({ ok: false });
    const second = await added(all('administrator'));
    const answers = await Promise.all([
      changeRoles(administrator, own, [all('viewer')]),
      deactivatePerson(administrator, second, true),
    ]);
    expect(answers.filter((answer) => answer.ok)).toHaveLength(1);
    const left = (await listPeople(administrator)).filter(
      ({ grants, deactivatedAt }) =>
        deactivatedAt === null && grants.some(({ role }) => role === 'administrator'),
    );
    expect(left).toHaveLength(1);
    await getPool().query(
      `INSERT INTO role_grant (person_id, role, granted_by) VALUES ($1, 'administrator', 'test') ON CONFLICT DO NOTHING`,
      [own],
    );
  });

  it('of the demonstration line stay as they are', async () => {
    await getPool().query(
      `INSERT INTO person (id, name, email, demonstration) VALUES ('demo-x', 'x', 'x@demonstration.invalid', true)`,
    );
    expect(await changeRoles(administrator, 'demo-x', [all('administrator')])).toMatchObject({ ok: false });
    expect(await deactivatePerson(administrator, 'demo-x', true)).toMatchObject({ ok: false });
  });

  it('are the business of administrators only', async () => {
    const owner = asPerson('x', all('process-owner'), all('manager'));
    const refused = { ok: false, reason: expect.stringContaining('Your roles do not allow this') };
    const someone = { name: 'x', email: 'x@plant.example', grants: [] };
    expect(await addPerson(owner, someone)).toEqual(refused);
    expect(await changeRoles(owner, administrator.id ?? '', [])).toEqual(refused);
    expect(await deactivatePerson(owner, administrator.id ?? '', true)).toEqual(refused);
    expect(await endSessions(owner, administrator.id ?? '')).toEqual(refused);
    expect(await invitePerson(owner, administrator.id ?? '')).toEqual(refused);
    await expect(listPeople(owner)).rejects.toThrow('Your roles do not allow this');
  });
});

describe('tokens', () => {
  const wish = { name: 'gauge 3', scope: 'intake', streamIds: null, days: 30 } as const;
  const made = async (fields: Partial<Parameters<typeof makeToken>[1]> = {}) => {
    const answer = await makeToken(administrator, { ...wish, ...fields });
    if (!answer.ok) throw new Error(answer.reason);
    return answer.value;
  };

  it('are kept as a digest only, and stand for what they were made for', async () => {
    const token = await made({ streamIds: [stream.id] });
    expect(token).toMatch(/^ev_[\w-]{43}$/);
    const { rows } = await getPool().query('SELECT t::text AS text FROM access_token t');
    expect(rows.map((row) => row.text as string).join()).not.toContain(token.slice(8));
    const actor = await findTokenActor(token);
    if (actor === null) throw new Error('the token opens nothing');
    expect(may(actor, 'record-maps', stream.id)).toBe(true);
    expect(may(actor, 'record-maps', other.id)).toBe(false);
    expect(may(actor, 'see-line')).toBe(false);
    expect(actor.name).toBe('gauge 3 (token)');
    const told = await lastTold();
    expect(told).toMatchObject({ action: 'made a token', after: { name: 'gauge 3', streams: [stream.id] } });
    expect(JSON.stringify(told)).not.toContain(token);
  });

  it('for reading read, and record nothing', async () => {
    const actor = await findTokenActor(await made({ scope: 'read', streamIds: [stream.id] }));
    if (actor === null) throw new Error('the token opens nothing');
    expect(may(actor, 'see-line', other.id)).toBe(true);
    expect(may(actor, 'record-maps', stream.id)).toBe(false);
  });

  it('show when they were last used, written at most once a minute', async () => {
    const token = await made({ name: 'used' });
    const on = async () => (await listTokens(administrator)).find((one) => one.name === 'used')?.lastUsedAt;
    expect(await on()).toBeNull();
    await findTokenActor(token);
    const first = await on();
    expect(first).toBeInstanceOf(Date);
    await findTokenActor(token);
    expect(await on()).toEqual(first);
    await getPool().query(
      `UPDATE access_token SET last_used_at = last_used_at - interval '2 minutes' WHERE name = 'used'`,
    );
    await findTokenActor(token);
    expect((await on())?.getTime()).toBeGreaterThanOrEqual(first?.getTime() ?? Infinity);
  });

  it('open nothing once revoked or expired, nor altered by a letter', async () => {
    const token = await made({ name: 'short' });
    expect(isActing(await findTokenActor(token))).toBe(true);
    const altered = token.slice(0, -2) + (token.at(-2) === 'A' ? 'B' : 'A') + token.slice(-1);
    expect(await findTokenActor(altered)).toBeNull();
    expect(await findTokenActor('')).toBeNull();
    expect(await findTokenActor(`${token}\n`)).toBeNull();
    await getPool().query(
      `UPDATE access_token SET created_at = now() - interval '2 days', expires_at = now() - interval '1 second'
       WHERE name = 'short'`,
    );
    expect(await findTokenActor(token)).toBeNull();

    const next = await made({ name: 'next' });
    const id = (await listTokens(administrator)).find((one) => one.name === 'next')?.id ?? '';
    expect(await revokeToken(administrator, id)).toMatchObject({ ok: true });
    expect(await findTokenActor(next)).toBeNull();
    expect(await revokeToken(administrator, id)).toMatchObject({ ok: false });
    expect(await lastTold()).toMatchObject({ action: 'revoked a token', subject_id: id });
  });

  it('are the business of administrators only', async () => {
    const owner = asPerson('x', all('process-owner'));
    expect(await makeToken(owner, wish)).toMatchObject({ ok: false });
    expect(await revokeToken(owner, '1')).toMatchObject({ ok: false });
    await expect(listTokens(owner)).rejects.toThrow('Your roles do not allow this');
  });
});
