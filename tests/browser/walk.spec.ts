import { readFileSync } from 'node:fs';
import path from 'node:path';
import { expect, test } from '@playwright/test';
import { may, provenActor, type Actor } from '@/lib/access/actor';
import { AUTH_PATHS } from '@/lib/access/auth-paths';
import { ACTIONS, type ActionCall } from './walk-actions';
import { askAction, askPage, askRoute, type Asker, type Outcome } from './walk-asking';
import {
  ABSENT_PAGES,
  addressOf,
  LIBRARY_ROUTE,
  LIBRARY_TO_NOBODY,
  type Need,
  PAGES,
  ROUTES,
  type WalkPlace,
} from './walk-expectations';
import { startWalkServer, type WalkServer } from './walk-server';

const built = path.resolve(import.meta.dirname, '../../.next/server');
const manifest = <Shape>(name: string) => JSON.parse(readFileSync(path.join(built, name), 'utf8')) as Shape;

/** Everybody who walks, each with what the table of permissions is asked about them; null for nobody. */
type Walker = Asker & { actor: Actor | null };

let server: WalkServer;
let walkers: Walker[] = [];
let place: WalkPlace;

test.describe.configure({ mode: 'serial', timeout: 120_000 });

test.beforeAll(async () => {
  // A second server, its database and its line: on a busy machine they take their time.
  test.setTimeout(180_000);
  server = await startWalkServer();
  walkers = gather();
  const owner = walkers.find(({ name }) => name === 'process-owner');
  const sent = await fetch(`${server.origin}/api/intake`, {
    method: 'POST',
    headers: { ...owner?.headers, origin: server.origin },
    body: server.line.own.file,
  });
  const { href } = (await sent.json()) as { href: string };
  place = { ...server.line, waiting: href.replace('/intake/', '') };
});
test.afterAll(() => server?.stop());

test('every page opens for those whom the table of permissions names, and for no one else', async () => {
  const names = pathsOfKind('page');
  expect.soft(names.filter((name) => !(name in PAGES) && !ABSENT_PAGES.includes(name))).toEqual([]);
  for (const [name, needs] of Object.entries(PAGES)) {
    const address = addressOf(name, place);
    const found = await walk(walkers, (walker) => askPage(server.origin, address, walker));
    // Someone who is signed in is led on from the sign-in page.
    if (name === '/sign-in/page') expect(found['nobody']).toBe('allowed');
    else expect.soft(found, name).toEqual(expected(needs));
  }
});

test('every route answers those whom the table of permissions names, and no one else', async () => {
  const names = pathsOfKind('route').filter((name) => name !== LIBRARY_ROUTE);
  expect.soft(names.filter((name) => !(name in ROUTES))).toEqual([]);
  for (const [name, methods] of Object.entries(ROUTES)) {
    const address = addressOf(name, place);
    for (const method of ['GET', 'POST', 'PUT', 'PATCH', 'DELETE'] as const) {
      const needs = (methods as Partial<Record<string, Need>>)[method];
      if (needs === undefined) {
        const { status } = await fetch(server.origin + address, {
          method,
          headers: { ...walkers.find((one) => one.name === 'process-owner')?.headers, origin: server.origin },
        });
        expect.soft([404, 405], `${method} ${name} answers ${status}`).toContain(status);
        continue;
      }
      const body = method === 'POST' ? place.own.file : undefined;
      const found = await walk(walkers, (walker) => askRoute(server.origin, method, address, walker, body));
      expect.soft(found, `${method} ${name}`).toEqual(expected(needs));
    }
  }
});

test('every action does its work for those whom the table of permissions names, and for no one else', async () => {
  const { node } = manifest<{
    node: Record<string, { filename: string; exportedName: string; workers: Record<string, unknown> }>;
  }>('server-reference-manifest.json');
  const entries = Object.entries(node).map(([id, { filename, exportedName, workers }]) => ({
    id,
    name: `${filename} ${exportedName}`,
    address: addressOf(`/${Object.keys(workers)[0]?.replace(/^app\//, '') ?? ''}`, place),
  }));
  expect.soft(entries.map(({ name }) => name).filter((name) => !(name in ACTIONS))).toEqual([]);
  expect.soft(entries.map(({ name }) => name).sort()).toEqual(Object.keys(ACTIONS).sort());
  // In the order of the table: what a later call needs is not taken away by one before it.
  for (const [name, calls] of Object.entries(ACTIONS)) {
    const entry = entries.find((one) => one.name === name);
    if (entry === undefined) continue;
    for (const call of calls) {
      const ask = (asker: Asker) =>
        askAction(
          server.origin,
          entry,
          { args: call.args(place), fields: call.silent ? null : (call.fields?.(place) ?? {}) },
          asker,
        );
      const due = expected(call.needs, call);
      // Those first who may not: afterwards there may be nothing left to refuse.
      const refused = walkers.filter(({ name: who }) => due[who] !== 'allowed');
      const allowed = walkers.filter(({ name: who }) => due[who] === 'allowed');
      const found = { ...(await walk(refused, ask)), ...(await walk(allowed, ask)) };
      expect.soft(found, `${name}: ${call.needs}`).toEqual(due);
    }
  }
});

test('of the accounts library only the endpoints in use exist', async () => {
  const known = new Set<string>(AUTH_PATHS);
  expect.soft(Object.keys(LIBRARY_TO_NOBODY).sort()).toEqual([...AUTH_PATHS].sort());
  const walked = walkers.filter(({ name }) => ['nobody', 'administrator', 'reading'].includes(name));
  for (const { method, path: named } of place.endpoints) {
    const name = `${method} ${named.replace(/:\w+/g, 'plant')}`;
    const isInUse = known.has(name);
    for (const walker of isInUse ? walked.filter(({ actor }) => actor === null) : walked) {
      const { status } = await library(name, walker);
      expect.soft(status, `${name} as ${walker.name}`).toBe(isInUse ? LIBRARY_TO_NOBODY[name] : 404);
    }
  }
});

function library(name: string, { headers }: Asker): Promise<Response> {
  const [method = '', address = ''] = name.split(' ');
  const passwords = JSON.stringify({ currentPassword: 'none of mine', newPassword: 'eleven quiet furnaces' });
  const body = address === '/change-password' ? passwords : '{}';
  const sends = method !== 'GET' && method !== 'HEAD';
  return fetch(`${server.origin}/api/auth${address}`, {
    method,
    redirect: 'manual',
    headers: { ...headers, origin: server.origin, ...(sends && { 'content-type': 'application/json' }) },
    ...(sends && { body }),
  });
}

/** Pages or routes of the build, by name. */
function pathsOfKind(kind: 'page' | 'route'): string[] {
  return Object.keys(manifest<Record<string, string>>('app-paths-manifest.json')).filter((name) =>
    name.endsWith(`/${kind}`),
  );
}

/** Everybody on the line: a person by the cookie of their session, a machine by its token. */
function gather(): Walker[] {
  const found: Walker[] = [{ name: 'nobody', headers: {}, actor: null }];
  for (const [name, { id, cookie, grants }] of Object.entries(server.line.people)) {
    found.push({ name, headers: { cookie }, actor: provenActor({ kind: 'person', id, name, grants }) });
  }
  const { other, tokens } = server.line;
  const scopes = {
    reading: { scope: 'read', streamIds: null },
    recording: { scope: 'intake', streamIds: null },
    'recording of another stream': { scope: 'intake', streamIds: [other.id] },
    revoked: null,
    expired: null,
  } as const;
  for (const [name, { id, text }] of Object.entries(tokens)) {
    const token = scopes[name as keyof typeof scopes];
    const actor = token && provenActor({ kind: 'token', id, name, grants: [], token });
    found.push({ name, headers: { authorization: `Bearer ${text}` }, actor });
  }
  return found;
}

/** What the table of permissions says of everybody. */
function expected(needs: Need, call: Pick<ActionCall, 'ofOwn' | 'silent'> = {}): Record<string, Outcome> {
  const streamId = call.ofOwn && !call.silent ? place.own.id : undefined;
  const outcome = ({ actor }: Walker): Outcome => {
    if (needs === 'anyone') return 'allowed';
    if (actor === null) return 'nobody';
    if (needs === 'person') return actor.kind === 'person' ? 'allowed' : 'nobody';
    return may(actor, needs, streamId) ? 'allowed' : 'refused';
  };
  return Object.fromEntries(walkers.map((walker) => [walker.name, outcome(walker)]));
}

async function walk(
  those: readonly Walker[],
  ask: (walker: Walker) => Promise<Outcome>,
): Promise<Record<string, Outcome>> {
  return Object.fromEntries(
    await Promise.all(those.map(async (walker) => [walker.name, await ask(walker)] as const)),
  );
}
