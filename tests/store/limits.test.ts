import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { getPool } from '@/lib/database/client';
import { findFirstLevels } from '@/lib/limits/data';
import { approveLimits, changeScreening, discardLimits, draftLimits } from '@/lib/limits/mutations';
import { freshDatabase, type FreshDatabase } from '../support/fresh-database';
import {
  actor,
  hour,
  judgementOf,
  newStream,
  quietLevel,
  record,
  recordInTurn,
  rulesOf,
  settleLimits,
  wafer,
} from '../support/store-line';

let database: FreshDatabase;

beforeAll(async () => {
  database = await freshDatabase();
});

afterAll(() => database.drop());

const revisionsOf = async (streamId: string) =>
  (
    await getPool().query<{
      id: string;
      state: string;
      origin: string;
      effective_from: Date;
      centre: number;
      subgroups: number;
    }>(
      'SELECT id, state, origin, effective_from, centre, subgroups FROM limit_revision WHERE stream_id = $1 ORDER BY revision',
      [streamId],
    )
  ).rows;

/** A stream with 30 quiet wafers, of which the first 25 gave its first limits. */
async function begunStream(fields: Parameters<typeof newStream>[0] = {}): Promise<string> {
  const { id } = await newStream(fields);
  await recordInTurn(Array.from({ length: 30 }, (_, i) => wafer(id, i)));
  return id;
}

const approval = (effectiveFrom: Date) => ({ reason: 'looked at', effectiveFrom });

describe('the first limits', () => {
  it('come of the first 25 subgroups, provisional, and judge what follows', async () => {
    const id = await begunStream();
    expect(await revisionsOf(id)).toMatchObject([
      { state: 'provisional', origin: 'first-baseline', subgroups: 25, effective_from: hour(24) },
    ]);
    const { points } = await judgementOf(id);
    expect(points.map(({ revision }) => revision)).toEqual([
      ...Array.from({ length: 25 }, () => null),
      ...Array.from({ length: 5 }, () => 1),
    ]);
  });

  it('go on as they were once approved, by whom and why on record', async () => {
    const id = await begunStream();
    const before = await judgementOf(id);
    const [first] = await revisionsOf(id);
    expect(await approveLimits(actor, first!.id, approval(hour(0)))).toEqual({ ok: true });
    expect(await judgementOf(id)).toEqual(before);
    expect(await revisionsOf(id)).toEqual([{ ...first, state: 'approved' }]);
    const { rows } = await getPool().query(
      'SELECT approved_by, approval_reason FROM limit_revision WHERE id = $1',
      [first!.id],
    );
    expect(rows[0]).toEqual({ approved_by: actor.name, approval_reason: 'looked at' });
    expect(await approveLimits(actor, first!.id, approval(hour(0)))).toEqual({
      ok: false,
      reason: 'Revision 1 is approved already.',
    });
  });

  it('do not come of levels that are all equal', async () => {
    const { id } = await newStream();
    await record(
      Array.from({ length: 26 }, (_, i) => ({ ...wafer(id, i), readings: wafer(id, 0, 10).readings })),
    );
    expect(await revisionsOf(id)).toEqual([]);
    expect(await findFirstLevels(actor, id)).toEqual({ judged: 25, alike: true });
    await record(Array.from({ length: 24 }, (_, i) => wafer(id, 26 + i)));
    expect(await revisionsOf(id)).toMatchObject([
      { state: 'provisional', subgroups: 25, effective_from: hour(49) },
    ]);
  });
});

describe('drafted limits', () => {
  const span = { from: hour(0), to: hour(9) };

  it('judge nothing until approved, then what lies after the instant they take force', async () => {
    const id = await begunStream();
    await record([wafer(id, 30, 10.5)]);
    const before = await judgementOf(id);
    expect(await draftLimits(actor, id, span, 'a calm span')).toEqual({ ok: true });
    expect(await judgementOf(id)).toEqual(before);
    const draft = (await revisionsOf(id))[1]!;
    expect(draft).toMatchObject({ state: 'draft', origin: 'chosen-span', subgroups: 10 });
    await approveLimits(actor, draft.id, approval(hour(27)));
    const { points } = await judgementOf(id);
    expect(points.slice(24).map(({ revision }) => revision)).toEqual([null, 1, 1, 1, 2, 2, 2]);
    expect(await rulesOf(id)).toContain('level:beyond-3-sigma');
    await record([wafer(id, 31)]);
    expect((await judgementOf(id)).points.at(-1)?.revision).toBe(2);
  });

  it('withdraw a signal that no longer holds under them', async () => {
    const { id } = await newStream();
    await recordInTurn(
      Array.from({ length: 30 }, (_, i) => wafer(id, i, i < 25 ? quietLevel(i) : 10.5 + quietLevel(i) - 10)),
    );
    expect((await rulesOf(id)).length).toBeGreaterThan(0);
    expect(await draftLimits(actor, id, { from: hour(25), to: hour(29) }, 'the level that is meant')).toEqual(
      { ok: true },
    );
    await approveLimits(actor, (await revisionsOf(id))[1]!.id, approval(hour(24)));
    expect((await rulesOf(id)).filter((rule) => rule.startsWith('level'))).toEqual([]);
    const { rows } = await getPool().query(
      'SELECT DISTINCT withdrawn_reason FROM signal WHERE stream_id = $1 AND chart = $2',
      [id, 'level'],
    );
    expect(rows).toEqual([{ withdrawn_reason: 'limit revision 2 took force' }]);
  });

  it('are set aside or approved by one of several at once, and stay on record', async () => {
    const id = await begunStream();
    await draftLimits(actor, id, span, 'one');
    const draft = (await revisionsOf(id))[1]!;
    const answers = await Promise.all([
      approveLimits(actor, draft.id, approval(hour(20))),
      discardLimits(actor, draft.id),
      approveLimits(actor, draft.id, approval(hour(20))),
      discardLimits(actor, draft.id),
    ]);
    expect(answers.filter(({ ok }) => ok)).toHaveLength(1);
    expect(await revisionsOf(id)).toHaveLength(2);
    const [first] = await revisionsOf(id);
    expect(await discardLimits(actor, first!.id)).toEqual({
      ok: false,
      reason: 'Only a draft can be set aside.',
    });
    expect(await discardLimits(actor, '999999')).toMatchObject({ ok: false });
    expect(await approveLimits(actor, '999999', approval(hour(0)))).toMatchObject({ ok: false });
  });

  it('need two subgroups that differ', async () => {
    const { id } = await newStream();
    expect(await draftLimits(actor, id, span, 'none')).toMatchObject({
      ok: false,
      reason: expect.stringMatching(/holds 0 judged/),
    });
    await record([wafer(id, 0), { ...wafer(id, 1), readings: wafer(id, 0).readings }]);
    expect(await draftLimits(actor, id, { from: hour(0), to: hour(0) }, 'one')).toMatchObject({
      ok: false,
      reason: expect.stringMatching(/holds 1/),
    });
    expect(await draftLimits(actor, id, span, 'alike')).toMatchObject({
      ok: false,
      reason: expect.stringMatching(/equal/),
    });
    expect(await revisionsOf(id)).toEqual([]);
  });

  it('by several at once get numbers of their own', async () => {
    const id = await begunStream();
    await Promise.all([1, 2, 3, 4].map(() => draftLimits(actor, id, span, 'again')));
    expect(await revisionsOf(id)).toHaveLength(5);
  });
});

describe('limits on record', () => {
  it('are never edited or deleted', async () => {
    const { id } = await newStream();
    await settleLimits(id);
    expect(await revisionsOf(id)).toMatchObject([{ state: 'approved', origin: 'inherited', subgroups: 100 }]);
    for (const statement of [
      'UPDATE limit_revision SET upper = upper + 1',
      "UPDATE limit_revision SET state = 'discarded', approved_at = NULL, approved_by = NULL",
      'UPDATE limit_revision SET effective_from = now()',
      'UPDATE limit_revision SET superseded_from = now()',
      'DELETE FROM limit_revision',
    ])
      await expect(getPool().query(`${statement} WHERE stream_id = ${id}`)).rejects.toThrow('never edited');
  });
});

describe('changing how readings are screened', () => {
  it('begins a new provisional revision from the same baseline measured again', async () => {
    const { id } = await newStream({ screening: 'off' });
    const withZero = (i: number) => {
      const one = wafer(id, i);
      return { ...one, readings: one.readings.map((value, site) => (site === 0 ? 0 : value)) };
    };
    await recordInTurn(Array.from({ length: 26 }, (_, i) => withZero(i)));
    expect(await changeScreening(actor, id, 'impossible', 'zeros are no readings')).toEqual({ ok: true });
    const [first, second] = await revisionsOf(id);
    expect(first?.centre).toBeCloseTo((10 * 8) / 9, 0);
    expect(second).toMatchObject({
      state: 'provisional',
      origin: 'screening',
      subgroups: 25,
      centre: expect.closeTo(10, 0),
    });
    await record(
      [wafer(id, 27, 10)].map((one) => ({ ...one, facts: { ...one.facts, processedAt: new Date() } })),
    );
    expect((await judgementOf(id)).points.at(-1)).toMatchObject({ revision: 2 });
    expect(await changeScreening(actor, id, 'impossible', 'again')).toMatchObject({ ok: false });
  });

  it('that leaves no baseline is refused and changes nothing', async () => {
    const { id } = await newStream({ screening: 'off' });
    await recordInTurn(
      Array.from({ length: 25 }, (_, i) => {
        const one = wafer(id, i);
        return { ...one, readings: one.readings.map((value, site) => (site < 3 ? 0 : value)) };
      }),
    );
    expect(await changeScreening(actor, id, 'impossible', 'zeros')).toMatchObject({
      ok: false,
      reason: expect.stringMatching(/too few wafers/),
    });
    const { rows } = await getPool().query('SELECT screening FROM stream WHERE id = $1', [id]);
    expect(rows).toEqual([{ screening: 'off' }]);
    expect(await revisionsOf(id)).toHaveLength(1);
  });

  it('of a stream without limits changes the screening alone', async () => {
    const { id } = await newStream();
    expect(await changeScreening(actor, id, 'off', 'to see everything')).toEqual({ ok: true });
    expect(await revisionsOf(id)).toEqual([]);
    expect(await changeScreening(actor, '999999', 'off', 'none')).toMatchObject({ ok: false });
  });

  it('under inherited limits takes the latest judged subgroups for a baseline', async () => {
    const { id } = await newStream();
    await settleLimits(id);
    await record(Array.from({ length: 40 }, (_, i) => wafer(id, i)));
    expect(await changeScreening(actor, id, 'impossible', 'few sites')).toEqual({ ok: true });
    expect((await revisionsOf(id))[1]).toMatchObject({ origin: 'screening', subgroups: 25 });
  });
});
