import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { provenActor } from '@/lib/access/actor';
import { answerAuth } from '@/lib/access/auth-answer';
import { addPerson, deactivatePerson, invitePerson } from '@/lib/access/people';
import { findRequestActor } from '@/lib/access/request-actor';
import { getPool } from '@/lib/database/client';
import { freshDatabase, type FreshDatabase } from '../support/fresh-database';

const HOST = '127.0.0.1:3999';
const PASSWORD = 'eleven quiet furnaces';
const administrator = provenActor({
  kind: 'person',
  id: 'a',
  name: 'administrator',
  grants: [{ role: 'administrator', streamIds: null }],
});

let database: FreshDatabase;
beforeAll(async () => {
  database = await freshDatabase();
});
afterAll(() => database.drop());

let from = 0;
function post(path: string, body: object): Promise<Response> {
  const text = JSON.stringify(body);
  const headers = {
    'content-type': 'application/json',
    'content-length': String(text.length),
    host: HOST,
    origin: `http://${HOST}`,
    'x-forwarded-for': `10.1.0.${(from += 1)}`,
  };
  return answerAuth(new Request(`http://${HOST}/api/auth${path}`, { method: 'POST', headers, body: text }));
}

const choose = (token: string, newPassword = PASSWORD) => post('/reset-password', { token, newPassword });

async function signIn(email: string, password = PASSWORD) {
  const answer = await post('/sign-in/email', { email, password });
  const cookie = answer.headers.getSetCookie()[0]?.split(';')[0] ?? '';
  const actor = await findRequestActor(new Request(`http://${HOST}/`, { headers: { cookie } }));
  return { status: answer.status, actor, cookie };
}

async function newcomer(name: string) {
  const email = `${name}@plant.example`;
  const grants = [{ role: 'viewer' as const, streamIds: null }];
  const answer = await addPerson(administrator, { name, email, grants });
  if (!answer.ok) throw new Error(answer.reason);
  return { email, ...answer.value };
}

async function newCode(id: string): Promise<string> {
  const answer = await invitePerson(administrator, id);
  if (!answer.ok) throw new Error(answer.reason);
  return answer.value;
}

describe('a link by which someone chooses a password', () => {
  test('lets a new person in once, and no second time', async () => {
    const { email, code, id } = await newcomer('ottilie');
    expect((await signIn(email)).status).toBe(401);
    expect((await choose(code)).status).toBe(200);
    expect((await signIn(email)).actor).toMatchObject({ id, name: 'ottilie' });
    expect((await choose(code, 'another long password')).status).toBe(400);
    expect((await signIn(email)).status).toBe(200);
  });

  test('takes no password that is common, short, or the own address', async () => {
    const { email, code } = await newcomer('bram');
    expect((await choose(code, 'Password1234!')).status).toBe(400);
    expect((await choose(code, 'short')).status).toBe(400);
    expect((await choose(code, email)).status).toBe(400);
    expect((await choose(code)).status).toBe(200);
    expect((await signIn(email)).status).toBe(200);
  });

  test('replaces the one before it, ends the sessions of the old password, and expires', async () => {
    const { email, code, id } = await newcomer('noor');
    const second = await newCode(id);
    expect((await choose(code)).status).toBe(400);
    expect((await choose(second)).status).toBe(200);
    const { cookie } = await signIn(email);
    expect((await choose(await newCode(id), 'nineteen loud furnaces')).status).toBe(200);
    expect(await findRequestActor(new Request(`http://${HOST}/`, { headers: { cookie } }))).toBeNull();
    expect((await signIn(email)).status).toBe(401);
    expect((await signIn(email, 'nineteen loud furnaces')).status).toBe(200);

    const late = await newCode(id);
    await getPool().query(
      `UPDATE verification SET expires_at = now() - interval '1 second' WHERE value = $1`,
      [id],
    );
    expect((await choose(late)).status).toBe(400);
  });

  test('is not opened by what the table holds of it, and not at all once its person is deactivated', async () => {
    const { code, id } = await newcomer('tove');
    const { rows } = await getPool().query<{ identifier: string }>(
      'SELECT identifier FROM verification WHERE value = $1',
      [id],
    );
    const kept = rows[0]?.identifier ?? '';
    for (const guess of [kept, `reset-password:${kept}`]) expect((await choose(guess)).status).toBe(400);
    expect(await deactivatePerson(administrator, id, true)).toMatchObject({ ok: true });
    expect((await choose(code)).status).toBe(400);
  });
});
