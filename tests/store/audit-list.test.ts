import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { provenActor, type Actor } from '@/lib/access/actor';
import { audited } from '@/lib/access/audited';
import type { Telling } from '@/lib/access/audit-entry';
import { listAuditEntries } from '@/lib/access/audit-trail';
import { getPool } from '@/lib/database/client';
import { freshDatabase, type FreshDatabase } from '../support/fresh-database';
import { newStream } from '../support/store-line';

const person = (name: string, role: 'manager' | 'process-owner'): Actor =>
  provenActor({ kind: 'person', id: name, name, grants: [{ role, streamIds: null }] });
const manager = person('Mara 100% sure', 'manager');
const owner = person('Otto', 'process-owner');
type Wish = Parameters<typeof listAuditEntries>[1];
const all: Wish = { who: null, stream: null, action: null, from: null, to: null };
const most = { skip: 0, most: 100 };

let database: FreshDatabase;
let first: Date;
let slug: string;
let otherSlug: string;
beforeAll(async () => {
  database = await freshDatabase();
  const { id, slug: own } = await newStream();
  const other = await newStream();
  [slug, otherSlug] = [own, other.slug];
  const told: [Actor, Telling][] = [
    [owner, { action: 'revised a target', subject: { kind: 'target-revision', id: '1' }, streamId: id }],
    [owner, { action: 'approved limits', subject: { kind: 'limit-revision', id: '1' }, streamId: other.id }],
    [manager, { action: 'changed a setting', subject: { kind: 'setting', id: 'four-eyes' } }],
    [
      owner,
      { action: 'retired a stream', subject: { kind: 'stream', id }, streamId: id, why: 'the tool is sold' },
    ],
  ];
  for (const [actor, telling] of told) await audited(actor, async (_, tell) => tell(telling));
  const { rows } = await getPool().query<{ at: Date }>(
    'SELECT at FROM audit_entry ORDER BY id DESC LIMIT 1 OFFSET 3',
  );
  first = rows[0]?.at as Date;
});
afterAll(() => database.drop());

const actions = async (wish: Partial<Wish>, page = most) =>
  (await listAuditEntries(manager, { ...all, ...wish }, page)).map(({ action }) => action);

describe('the list of the audit trail', () => {
  test('is the newest first, page by page', async () => {
    expect(await actions({}, { skip: 0, most: 2 })).toEqual(['retired a stream', 'changed a setting']);
    expect(await actions({}, { skip: 2, most: 2 })).toEqual(['approved limits', 'revised a target']);
  });

  test('can be asked for by who, where, what and when', async () => {
    expect(await actions({ who: 'otto' })).toHaveLength(3);
    expect(await actions({ who: '100%' })).toEqual(['changed a setting']);
    expect(await actions({ who: '_tto' })).toEqual([]);
    expect(await actions({ stream: otherSlug, action: 'approved limits' })).toHaveLength(1);
    expect(await actions({ stream: 'no-such' })).toEqual([]);
    expect(await actions({ from: first, who: 'otto' })).toHaveLength(3);
    expect(await actions({ to: first, who: 'otto' })).toEqual([]);
  });

  test('names what an entry is about', async () => {
    const [entry] = await listAuditEntries(manager, { ...all, action: 'retired a stream' }, most);
    expect(entry).toMatchObject({
      actorName: 'Otto',
      subjectName: slug,
      stream: { slug, name: slug },
      why: 'the tool is sold',
    });
  });

  test('is not for everyone', async () => {
    await expect(listAuditEntries(owner, all, most)).rejects.toThrow('Your roles do not allow this');
  });
});
