import { afterAll, beforeAll, describe, expect, test, vi } from 'vitest';
import { may } from '@/lib/access/actor';
import { answerAuth } from '@/lib/access/auth-answer';
import { ensureDemonstrationPeople } from '@/lib/access/demonstration';
import { createFirstAdministrator, isFirstAdministratorDue } from '@/lib/access/first-administrator';
import { withinGuesses } from '@/lib/access/guess-allowance';
import { findRequestActor } from '@/lib/access/request-actor';
import { getPool } from '@/lib/database/client';
import { freshDatabase, type FreshDatabase } from '../support/fresh-database';

const PASSWORD = 'four copper kettles';
const PERSON = { name: 'Rosa Lindqvist', email: 'rosa@plant.example', password: PASSWORD, code: '' };
const HOST = '127.0.0.1:3999';
let database: FreshDatabase;
let from = 0;

/** Posts to an endpoint of accounts as a page of this server does, from an address of its own: the rate is per address. */
async function post(path: string, body: object, more: { cookie?: string; peer?: string } = {}) {
  const headers = {
    'content-type': 'application/json',
    host: HOST,
    origin: `http://${HOST}`,
    'x-forwarded-for': more.peer ?? `10.0.0.${(from += 1)}`,
    ...(more.cookie === undefined ? {} : { cookie: more.cookie }),
  };
  const text = JSON.stringify(body);
  return answerAuth(
    new Request(`http://${HOST}/api/auth${path}`, {
      method: 'POST',
      headers: { ...headers, 'content-length': String(text.length) },
      body: text,
    }),
  );
}

const cookieOf = (answer: Response) => answer.headers.getSetCookie()[0]?.split(';')[0] ?? '';

async function signIn(password = PASSWORD, cookie?: string): Promise<{ status: number; cookie: string }> {
  const answer = await post(
    '/sign-in/email',
    { email: PERSON.email, password },
    { ...(cookie && { cookie }) },
  );
  return { status: answer.status, cookie: cookieOf(answer) };
}

const who = (cookie: string) => findRequestActor(new Request(`http://${HOST}/`, { headers: { cookie } }));

beforeAll(async () => {
  database = await freshDatabase();
  expect(await createFirstAdministrator(PERSON, true)).toEqual({ ok: true });
});
afterAll(() => database.drop());

describe('a session', () => {
  test('tells who acts, and with which roles', async () => {
    const actor = await who((await signIn()).cookie);
    expect(actor).toMatchObject({ kind: 'person', name: 'Rosa Lindqvist' });
    expect(actor?.grants).toEqual([{ role: 'administrator', streamIds: null }]);
    expect(actor && may(actor, 'manage-people')).toBe(true);
    expect(actor && may(actor, 'approve-limits')).toBe(false);
  });

  test('is kept in a cookie that scripts cannot read, for this site alone, for twelve hours', async () => {
    const answer = await post('/sign-in/email', PERSON);
    const [cookie = ''] = answer.headers.getSetCookie();
    expect(cookie).toMatch(/; Max-Age=43200; Path=\/; HttpOnly; SameSite=Lax$/);
    expect(cookie).toMatch(/^evenohm\.session_token=/);
  });

  test('is a new one at each sign-in: a cookie planted beforehand opens nothing', async () => {
    const planted = 'evenohm.session_token=chosen-by-someone-else.AAAA';
    const { cookie } = await signIn(PASSWORD, planted);
    expect(cookie).not.toContain('chosen-by-someone-else');
    expect(await who(planted)).toBeNull();
    const again = await signIn(PASSWORD, cookie);
    expect(again.cookie).not.toBe(cookie);
  });

  test('is not opened by a token read from the database, without its signature', async () => {
    const { cookie } = await signIn();
    const { rows } = await getPool().query<{ token: string }>(
      'SELECT token FROM session ORDER BY created_at DESC LIMIT 1',
    );
    const token = rows[0]?.token ?? '';
    expect(decodeURIComponent(cookie)).toContain(token);
    expect(await who(`evenohm.session_token=${token}`)).toBeNull();
    expect(await who(`evenohm.session_token=${token}.${Buffer.alloc(32).toString('base64')}`)).toBeNull();
  });

  test('is over when it is signed out: its cookie replayed opens nothing', async () => {
    const { cookie } = await signIn();
    expect(await who(cookie)).not.toBeNull();
    expect((await post('/sign-out', {}, { cookie })).status).toBe(200);
    expect(await who(cookie)).toBeNull();
  });

  test('is over everywhere when someone signs out everywhere', async () => {
    const [here, there] = [await signIn(), await signIn()];
    expect((await post('/revoke-other-sessions', {}, { cookie: here.cookie })).status).toBe(200);
    expect(await who(there.cookie)).toBeNull();
    expect(await who(here.cookie)).not.toBeNull();
    expect((await post('/revoke-sessions', {}, { cookie: here.cookie })).status).toBe(200);
    expect(await who(here.cookie)).toBeNull();
  });

  test('is over after its twelve hours, however much it was used', async () => {
    const { cookie } = await signIn();
    const { rows } = await getPool().query<{ hours: number }>(
      'SELECT max(extract(epoch FROM expires_at - now()) / 3600)::float AS hours FROM session',
    );
    expect(rows[0]?.hours).toBeCloseTo(12, 1);
    await getPool().query(`UPDATE session SET expires_at = now() - interval '1 second'`);
    expect(await who(cookie)).toBeNull();
    await getPool().query('DELETE FROM session');
  });

  test('is over when its person is deactivated, and none begins', async () => {
    const { cookie } = await signIn();
    await getPool().query('UPDATE person SET deactivated_at = now() WHERE email = $1', [PERSON.email]);
    expect(await who(cookie)).toBeNull();
    expect((await signIn()).status).toBe(403);
    await getPool().query('UPDATE person SET deactivated_at = NULL WHERE email = $1', [PERSON.email]);
  });
});

describe('signing in', () => {
  test('with a wrong password, or an unknown address, is refused in the same words', async () => {
    const wrong = await post('/sign-in/email', { ...PERSON, password: 'four copper kettlez' });
    const unknown = await post('/sign-in/email', { ...PERSON, email: 'nobody@plant.example' });
    expect([wrong.status, unknown.status]).toEqual([401, 401]);
    expect(await wrong.text()).toBe(await unknown.text());
  });

  test('is answered 429 with a time to wait after ten tries in a minute from one address', async () => {
    const statuses: number[] = [];
    for (let i = 0; i < 11; i += 1) {
      const answer = await post('/sign-in/email', { ...PERSON, password: 'guess' }, { peer: '10.9.9.9' });
      statuses.push(answer.status);
      if (i === 10) expect(Number(answer.headers.get('retry-after'))).toBeGreaterThan(0);
    }
    expect(statuses).toEqual([...Array<number>(10).fill(401), 429]);
  });

  test('is answered 429 for one account after many wrong tries, wherever they came from', async () => {
    const email = 'ivo@plant.example';
    const wrong = async () => new Response(null, { status: 401 });
    for (let i = 0; i < 20; i += 1) await withinGuesses(JSON.stringify({ email }), wrong);
    const answer = await post('/sign-in/email', { email, password: PASSWORD });
    expect(answer.status).toBe(429);
    expect(Number(answer.headers.get('retry-after'))).toBeGreaterThan(0);
    expect((await signIn()).status).toBe(200);
  });

  test('is refused from a page of another site', async () => {
    const text = JSON.stringify(PERSON);
    const answer = await answerAuth(
      new Request(`http://${HOST}/api/auth/sign-in/email`, {
        method: 'POST',
        headers: {
          'content-type': 'application/json',
          'content-length': String(text.length),
          host: HOST,
          origin: 'http://elsewhere.example',
          'x-forwarded-for': '10.1.1.1',
        },
        body: text,
      }),
    );
    expect(answer.status).toBe(403);
  });

  test('is refused with a body that is too large, or of unknown length, before it is read', async () => {
    const head = { host: HOST, origin: `http://${HOST}`, 'content-type': 'application/json' };
    for (const length of [{ 'content-length': '16385' }, {}]) {
      const request = new Request(`http://${HOST}/api/auth/sign-in/email`, {
        method: 'POST',
        headers: { ...head, ...length },
        body: JSON.stringify(PERSON),
      });
      const answer = await answerAuth(request);
      expect([answer.status, request.bodyUsed]).toEqual([422, false]);
    }
  });

  test('by endpoints that are not in use finds nothing there', async () => {
    for (const path of [
      '/sign-up/email',
      '/update-user',
      '/delete-user',
      '/change-email',
      '/list-sessions',
    ]) {
      expect((await post(path, PERSON)).status, path).toBe(404);
    }
  });
});

describe('changing a password', () => {
  const change = async (newPassword: string, currentPassword = PASSWORD) =>
    post('/change-password', { newPassword, currentPassword, revokeOtherSessions: true }, await signIn());

  test('to a common one is refused in words', async () => {
    const answer = await change('Password1234');
    expect(answer.status).toBe(400);
    expect(await answer.json()).toMatchObject({ message: expect.stringMatching(/tried first/) });
  });

  test('to the own address or name is refused in words', async () => {
    const answer = await change(PERSON.email);
    expect(answer.status).toBe(400);
    expect(await answer.json()).toMatchObject({ message: expect.stringMatching(/your own name or address/) });
  });

  test('needs the one before', async () => {
    expect((await change('five tin whistles', 'not this one')).status).toBe(400);
  });

  test('ends the other sessions', async () => {
    const other = await signIn();
    expect((await change('five tin whistles')).status).toBe(200);
    expect(await who(other.cookie)).toBeNull();
    expect((await signIn()).status).toBe(401);
    expect((await signIn('five tin whistles')).status).toBe(200);
  });
});

describe('the first administrator', () => {
  test('is entered once', async () => {
    expect(await isFirstAdministratorDue()).toBe(false);
    const second = await createFirstAdministrator({ ...PERSON, email: 'other@plant.example' }, true);
    expect(second).toEqual({ ok: false, reason: 'There is an administrator already.' });
  });

  test('is not entered from elsewhere without the code of the log', async () => {
    const refused = await createFirstAdministrator({ ...PERSON, code: 'aaaaa-aaaaa-aaaaa-aaaaa' }, false);
    expect(refused).toMatchObject({ ok: false, field: 'code' });
  });
});

describe('a person of the demonstration line', () => {
  const lookRound = () => post('/sign-in/demonstration', { role: 'shift-lead' });

  test('has one role and no password, and counts only while the line is offered on loopback', async () => {
    await ensureDemonstrationPeople();
    await ensureDemonstrationPeople();
    const answer = await lookRound();
    expect(answer.status).toBe(200);
    const actor = await who(cookieOf(answer));
    expect(actor).toMatchObject({ name: 'shift lead (demonstration)' });
    expect(actor?.grants).toEqual([{ role: 'shift-lead', streamIds: null }]);
    for (const [name, value] of [
      ['EVENOHM_DEMO', 'off'],
      ['EVENOHM_HOST', '0.0.0.0'],
      ['EVENOHM_URL', `http://${HOST}`],
    ] as const) {
      vi.stubEnv(name, value);
      expect((await lookRound()).status, name).toBe(403);
      expect(await who(cookieOf(answer)), name).toBeNull();
      vi.unstubAllEnvs();
    }
  });
});

describe('a server that is reached by https', () => {
  let own: FreshDatabase;
  beforeAll(async () => {
    vi.stubEnv('EVENOHM_URL', 'https://line.plant.example');
    own = await freshDatabase();
    await createFirstAdministrator(PERSON, true);
  });
  afterAll(async () => {
    await own.drop();
    vi.unstubAllEnvs();
  });

  test('marks its cookie Secure, under a name that only https may set', async () => {
    const text = JSON.stringify(PERSON);
    const headers = {
      'content-type': 'application/json',
      'content-length': String(text.length),
      host: 'line.plant.example',
      origin: 'https://line.plant.example',
      'x-forwarded-for': '10.2.2.2',
    };
    const answer = await answerAuth(
      new Request('http://line.plant.example/api/auth/sign-in/email', {
        method: 'POST',
        headers,
        body: text,
      }),
    );
    expect(answer.status).toBe(200);
    const [cookie = ''] = answer.headers.getSetCookie();
    expect(cookie).toMatch(/^__Secure-evenohm\.session_token=.*; HttpOnly; Secure; SameSite=Lax$/);
    expect(await who(cookieOf(answer))).toMatchObject({ name: PERSON.name });
    expect(await who(cookieOf(answer).replace('__Secure-', ''))).toBeNull();
  });
});
