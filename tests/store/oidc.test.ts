import { afterAll, beforeAll, describe, expect, test, vi } from 'vitest';
import { may } from '@/lib/access/actor';
import { answerAuth } from '@/lib/access/auth-answer';
import { findRequestActor } from '@/lib/access/request-actor';
import { getPool } from '@/lib/database/client';
import { freshDatabase, type FreshDatabase } from '../support/fresh-database';
import { CLIENT_SECRET, startOidcServer, type OidcServer } from '../support/oidc-server';

const ORIGIN = 'http://127.0.0.1:3998';
const ROSA = { sub: 'u-17', name: 'Rosa Lindqvist', email: 'rosa@plant.example', email_verified: true };
let database: FreshDatabase;
let provider: OidcServer;

/** A browser's jar of cookies for both servers, which differ by port and so share it (RFC 6265 §8.5). */
class Jar {
  readonly #cookies = new Map<string, string>();
  keep(answer: Response): void {
    for (const cookie of answer.headers.getSetCookie()) {
      const [pair = ''] = cookie.split(';');
      const at = pair.indexOf('=');
      if (/max-age=0/i.test(cookie)) this.#cookies.delete(pair.slice(0, at));
      else this.#cookies.set(pair.slice(0, at), pair.slice(at + 1));
    }
  }
  header(): string {
    return [...this.#cookies].map(([name, value]) => `${name}=${value}`).join('; ');
  }
}

function ask(method: string, url: string, jar: Jar, body?: string): Promise<Response> {
  const headers = {
    host: new URL(ORIGIN).host,
    origin: ORIGIN,
    'x-forwarded-for': '127.0.0.1',
    cookie: jar.header(),
    ...(body === undefined
      ? {}
      : { 'content-type': 'application/json', 'content-length': String(body.length) }),
  };
  return answerAuth(new Request(url, { method, headers, ...(body === undefined ? {} : { body }) }));
}

/** Goes from the button of the sign-in page by way of the provider back here; returns where that ends. */
async function signInByProvider(jar = new Jar()): Promise<{ end: string; jar: Jar }> {
  const body = JSON.stringify({ provider: 'plant', callbackURL: '/streams', errorCallbackURL: '/sign-in' });
  const begun = await ask('POST', `${ORIGIN}/api/auth/sign-in/social`, jar, body);
  expect(begun.status).toBe(200);
  jar.keep(begun);
  let { url } = (await begun.json()) as { url: string };
  for (let hop = 0; hop < 8; hop += 1) {
    const isOurs = url.startsWith(ORIGIN);
    if (isOurs && !url.startsWith(`${ORIGIN}/api/auth/`)) break;
    const answer = isOurs
      ? await ask('GET', url, jar)
      : await fetch(url, { redirect: 'manual', headers: { cookie: jar.header() } });
    jar.keep(answer);
    const next = answer.headers.get('location');
    if (next === null) throw new Error(`${url} answered ${answer.status}: ${await answer.text()}`);
    url = new URL(next, url).href;
  }
  return { end: url.replace(ORIGIN, ''), jar };
}

const who = (jar: Jar) => findRequestActor(new Request(ORIGIN, { headers: { cookie: jar.header() } }));

beforeAll(async () => {
  provider = await startOidcServer(`${ORIGIN}/api/auth/callback/plant`);
  vi.stubEnv('EVENOHM_OIDC_ISSUER', provider.issuer);
  vi.stubEnv('EVENOHM_OIDC_CLIENT_ID', 'evenohm');
  vi.stubEnv('EVENOHM_OIDC_CLIENT_SECRET', CLIENT_SECRET);
});
afterAll(async () => {
  await provider.close();
  vi.unstubAllEnvs();
});

async function enter(email: string): Promise<string> {
  const id = `person-${email}`;
  await getPool().query('INSERT INTO person (id, name, email) VALUES ($1, $2, $3)', [id, 'Rosa L.', email]);
  await getPool().query(
    `INSERT INTO role_grant (person_id, role, granted_by) VALUES ($1, 'manager', 'test')`,
    [id],
  );
  return id;
}

describe('someone whom the plant’s identity provider signs in', () => {
  beforeAll(async () => {
    database = await freshDatabase();
  });
  afterAll(() => database.drop());

  test('is refused in words while this server does not know them', async () => {
    provider.person = ROSA;
    const { end, jar } = await signInByProvider();
    expect(end).toBe('/sign-in?error=signup_disabled');
    expect(await who(jar)).toBeNull();
    expect((await getPool().query('SELECT FROM person')).rowCount).toBe(0);
  });

  test('is not taken for the person with that address where the provider does not vouch for it', async () => {
    await enter('mallory@plant.example');
    provider.person = {
      sub: 'u-66',
      name: 'Somebody',
      email: 'mallory@plant.example',
      email_verified: false,
    };
    const { end, jar } = await signInByProvider();
    expect(end).toBe('/sign-in?error=account_not_linked');
    expect(await who(jar)).toBeNull();
  });

  test('is the person whom an administrator entered with that address, with their roles', async () => {
    const id = await enter(ROSA.email);
    provider.person = ROSA;
    const { end, jar } = await signInByProvider();
    expect(end).toBe('/streams');
    expect(await who(jar)).toMatchObject({ id, grants: [{ role: 'manager', streamIds: null }] });
    expect(provider.lastAsked.get('code_challenge_method')).toBe('S256');
    expect(provider.lastAsked.get('redirect_uri')).toBe(`${ORIGIN}/api/auth/callback/plant`);
  });

  test('stays the same person when their address changes there, and none of the provider’s tokens is kept', async () => {
    provider.person = { ...ROSA, email: 'rosa.berg@plant.example' };
    const { jar } = await signInByProvider();
    expect(await who(jar)).toMatchObject({ id: `person-${ROSA.email}` });
    const { rows } = await getPool().query(
      `SELECT access_token, refresh_token, id_token FROM account WHERE provider_id = 'plant'`,
    );
    expect(rows).toEqual([{ access_token: null, refresh_token: null, id_token: null }]);
  });

  test('is refused once deactivated', async () => {
    await getPool().query('UPDATE person SET deactivated_at = now() WHERE email = $1', [ROSA.email]);
    const { end, jar } = await signInByProvider();
    expect(end).toMatch(/^\/sign-in\?error=DEACTIVATED/);
    expect(await who(jar)).toBeNull();
  });
});

describe('where the provider is trusted to bring new people', () => {
  let other: FreshDatabase;
  beforeAll(async () => {
    vi.stubEnv('EVENOHM_OIDC_CREATE', 'on');
    other = await freshDatabase();
  });
  afterAll(() => other.drop());

  test('someone unknown becomes a person without any role', async () => {
    provider.person = { sub: 'u-99', name: 'Ines Okafor', email: 'ines@plant.example', email_verified: true };
    const { end, jar } = await signInByProvider();
    expect(end).toBe('/streams');
    const actor = await who(jar);
    expect(actor).toMatchObject({ kind: 'person', name: 'Ines Okafor', grants: [] });
    expect(actor && may(actor, 'see-line')).toBe(false);
  });
});
