/**
 * Puts a small line into the database of EVENOHM_DATA, with someone of each role and tokens of each kind, and prints
 * what it made as JSON. A process of its own: the test that walks the built app runs elsewhere.
 */
import { createHmac } from 'node:crypto';
import { provenActor, type Grant } from '@/lib/access/actor';
import { accounts } from '@/lib/access/accounts';
import { addPerson } from '@/lib/access/people';
import { programActor } from '@/lib/access/local-actor';
import { ROLES } from '@/lib/access/permission';
import { makeToken, revokeToken } from '@/lib/access/tokens';
import { getPool } from '@/lib/database/client';
import { openDatabase } from '@/lib/database/connection';
import { draftLimits } from '@/lib/limits/mutations';
import { casesOf, fileText, hour, newStream, recordInTurn, settleLimits, wafer } from '../support/store-line';

const program = programActor();

/** A stream with judged wafers, the last of them so far off that a case is open, and a draft of limits. */
async function streamWithCase() {
  const { id, slug } = await newStream();
  await settleLimits(id);
  await recordInTurn([0, 1, 2, 3].map((i) => wafer(id, i)).concat(wafer(id, 4, 12)));
  await draftLimits(provenActor({ ...program }), id, { from: hour(0), to: hour(3) }, 'to be approved');
  const one = async (text: string) => (await getPool().query<{ id: string }>(text, [id])).rows[0]?.id ?? '';
  return {
    id,
    slug,
    excursionId: (await casesOf(id))[0]?.id ?? '',
    waferId: await one('SELECT id FROM wafer_measurement WHERE stream_id = $1 ORDER BY id LIMIT 1'),
    batchId: await one('SELECT batch_id AS id FROM wafer_measurement WHERE stream_id = $1 LIMIT 1'),
    draftId: await one(`SELECT id FROM limit_revision WHERE stream_id = $1 AND state = 'draft'`),
    file: fileText(slug, [wafer(id, 50)]),
  };
}

/** A person who is signed in: tests of sign-in are elsewhere. */
async function person(name: string, grants: readonly Grant[]) {
  const email = `${name}@plant.example`;
  const added = await addPerson(program, { name, email, grants });
  if (!added.ok) throw new Error(added.reason);
  const { id } = added.value;
  const { internalAdapter, secret } = await accounts().$context;
  const { token } = await internalAdapter.createSession(id);
  const signature = createHmac('sha256', secret).update(token).digest('base64');
  return { id, grants, cookie: `evenohm.session_token=${encodeURIComponent(`${token}.${signature}`)}` };
}

async function token(name: string, scope: 'read' | 'intake', streamIds: string[] | null = null) {
  const made = await makeToken(program, { name, scope, streamIds, days: 30 });
  if (!made.ok) throw new Error(made.reason);
  const { rows } = await getPool().query<{ id: string }>('SELECT max(id) AS id FROM access_token');
  return { id: rows[0]?.id ?? '', text: made.value };
}

async function walkLine() {
  const own = await streamWithCase();
  const other = await newStream();
  const people: Record<string, Awaited<ReturnType<typeof person>>> = {};
  for (const role of ROLES) people[role] = await person(role, [{ role, streamIds: null }]);
  for (const role of ['shift-lead', 'process-owner'] as const) {
    people[`${role} of another stream`] = await person(`${role}-elsewhere`, [
      { role, streamIds: [other.id] },
    ]);
  }
  people['person without a role'] = await person('newcomer', []);
  const spare = await person('spare', []);
  const tokens = {
    reading: await token('reading', 'read'),
    recording: await token('recording', 'intake'),
    'recording of another stream': await token('recording elsewhere', 'intake', [other.id]),
    revoked: await token('revoked', 'read'),
    expired: await token('expired', 'intake'),
  };
  const spareToken = await token('spare', 'read');
  await revokeToken(program, tokens.revoked.id);
  await getPool().query(
    `UPDATE access_token SET created_at = now() - interval '2 days', expires_at = now() - interval '1 second' WHERE id = $1`,
    [tokens.expired.id],
  );
  const endpoints = Object.values(accounts().api as Record<string, unknown>).flatMap((endpoint) => {
    const { path, options } = endpoint as { path?: string; options?: { method?: string | string[] } };
    return path === undefined ? [] : [options?.method ?? 'GET'].flat().map((method) => ({ method, path }));
  });
  return { own, other, people, spare, tokens, spareToken, endpoints };
}

export type WalkLine = Awaited<ReturnType<typeof walkLine>>;

const database = await openDatabase({ say: () => undefined });
try {
  console.log(JSON.stringify(await walkLine()));
} finally {
  await database.close();
}
