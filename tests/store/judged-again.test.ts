import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { getPool } from '@/lib/database/client';
import { stepExcursion } from '@/lib/excursions/mutations';
import { decideReading } from '@/lib/maps/mutations';
import { recordStreamEvent } from '@/lib/streams/mutations';
import { freshDatabase, type FreshDatabase } from '../support/fresh-database';
import {
  actor,
  casesOf,
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

async function settledStream(): Promise<string> {
  const { id } = await newStream();
  await settleLimits(id);
  return id;
}

async function recordOne(streamId: string, i: number, level?: number): Promise<string> {
  const [outcome] = await record([wafer(streamId, i, level)]);
  if (outcome?.kind !== 'recorded') throw new Error('The wafer was not recorded.');
  return outcome.waferId;
}

const waferRow = async (id: string) =>
  (
    await getPool().query(
      'SELECT mean, bad_sites, good_sites, bad_site_indices, bad_site_reasons, level, specification FROM wafer_measurement WHERE id = $1',
      [id],
    )
  ).rows[0];

describe("a person's word on a reading", () => {
  /** One reading of a quiet wafer is three times as high: its level lies beyond the limit. */
  async function wild(): Promise<{ streamId: string; waferId: string }> {
    const streamId = await settledStream();
    await recordInTurn(Array.from({ length: 10 }, (_, i) => wafer(streamId, i)));
    const one = wafer(streamId, 10);
    one.readings = one.readings.map((value, site) => (site === 4 ? 30 : value));
    const [outcome] = await record([one]);
    await recordInTurn([wafer(streamId, 11), wafer(streamId, 12)]);
    return { streamId, waferId: outcome?.kind === 'recorded' ? outcome.waferId : '' };
  }

  it('measures the wafer and judges its stream again, and back puts everything as it was', async () => {
    const { streamId, waferId } = await wild();
    const [before, row] = [await judgementOf(streamId), await waferRow(waferId)];
    expect(before.signals.map(({ chart }) => chart)).toEqual(expect.arrayContaining(['level', 'within']));
    const out = { siteIndex: 4, action: 'out' as const, reason: 'dust on the probe' };
    expect(await decideReading(actor, streamId, waferId, out)).toEqual({ ok: true });
    expect(await waferRow(waferId)).toMatchObject({
      bad_sites: 1,
      good_sites: 8,
      bad_site_indices: [4],
      bad_site_reasons: ['by-hand'],
      level: expect.closeTo(10, 0),
    });
    expect(await rulesOf(streamId)).toEqual([]);
    const { rows } = await getPool().query('SELECT withdrawn_reason FROM signal WHERE stream_id = $1', [
      streamId,
    ]);
    expect(rows.length).toBe(before.signals.length);
    for (const { withdrawn_reason } of rows)
      expect(withdrawn_reason).toContain('taken out: dust on the probe');
    await decideReading(actor, streamId, waferId, { siteIndex: 4, action: 'in', reason: 'it was no dust' });
    expect(await judgementOf(streamId)).toEqual(before);
    expect(await waferRow(waferId)).toEqual(row);
    const reading = await getPool().query(
      'SELECT reading[5] AS value FROM wafer_reading WHERE wafer_id = $1',
      [waferId],
    );
    expect(reading.rows[0]?.value).toBe(30);
    const entries = await getPool().query('SELECT action, actor, reason FROM reading_exclusion ORDER BY id');
    expect(entries.rows.map(({ action }) => action)).toEqual(['out', 'in']);
    await expect(getPool().query("UPDATE reading_exclusion SET reason = 'x'")).rejects.toThrow(
      'never changed',
    );
  });

  it('never undoes a case that someone may have acted on', async () => {
    const { streamId, waferId } = await wild();
    const cases = await casesOf(streamId);
    expect(cases.length).toBeGreaterThan(0);
    await decideReading(actor, streamId, waferId, { siteIndex: 4, action: 'out', reason: 'dust' });
    expect(await casesOf(streamId)).toEqual(cases);
  });

  it('is refused on an impossible reading, a site and a wafer that are not there, and changes nothing then', async () => {
    const streamId = await settledStream();
    const one = wafer(streamId, 0);
    one.readings = one.readings.map((value, site) => (site === 1 ? -1 : site === 2 ? null : value));
    const [outcome] = await record([one]);
    const waferId = outcome?.kind === 'recorded' ? outcome.waferId : '';
    const decide = (id: string, siteIndex: number) =>
      decideReading(actor, streamId, id, { siteIndex, action: 'in', reason: 'because' });
    for (const site of [1, 2])
      expect(await decide(waferId, site)).toMatchObject({
        ok: false,
        reason: expect.stringMatching(/impossible/),
      });
    for (const site of [9, -1, 0.5])
      expect(await decide(waferId, site)).toMatchObject({
        ok: false,
        reason: expect.stringMatching(/no such site/),
      });
    expect(await decide('999999', 0)).toMatchObject({
      ok: false,
      reason: expect.stringMatching(/no such wafer/),
    });
    expect(
      await decideReading(actor, '999999', waferId, { siteIndex: 0, action: 'out', reason: 'r' }),
    ).toMatchObject({
      ok: false,
    });
    const { rows } = await getPool().query('SELECT FROM reading_exclusion WHERE wafer_id = $1', [waferId]);
    expect(rows).toEqual([]);
  });

  it('can take so many readings out that the wafer is not judged, and its point goes', async () => {
    const streamId = await settledStream();
    const waferId = await recordOne(streamId, 0, 11);
    for (const siteIndex of [0, 1])
      await decideReading(actor, streamId, waferId, { siteIndex, action: 'out', reason: 'scratch' });
    const { points, signals } = await judgementOf(streamId);
    expect(points).toMatchObject([{ state: 'not-judged', level: null, completions: [] }]);
    expect(signals).toEqual([]);
  });

  it('from many people at once on one wafer ends with every word counted', async () => {
    const streamId = await settledStream();
    const waferId = await recordOne(streamId, 0);
    const words = [
      ...[0, 1, 2].map((siteIndex) => ({ siteIndex, action: 'out' as const, reason: 'scratch' })),
      ...[3, 4].map((siteIndex) => ({ siteIndex, action: 'in' as const, reason: 'sound' })),
    ];
    await Promise.all([
      ...words.map((word) => decideReading(actor, streamId, waferId, word)),
      ...[1, 2, 3].map((i) => record([wafer(streamId, i)])),
    ]);
    expect(await waferRow(waferId)).toMatchObject({ bad_site_indices: [0, 1, 2], level: null });
    expect((await judgementOf(streamId)).points).toHaveLength(4);
  });
});

describe('a restart', () => {
  it('parts the stream: a run across it is withdrawn and no range spans it', async () => {
    const streamId = await settledStream();
    await record(
      Array.from({ length: 20 }, (_, i) => wafer(streamId, i, i < 6 ? quietLevel(i) : 10.08 + i / 1e4)),
    );
    expect(await rulesOf(streamId)).toEqual(['level:eight-on-one-side']);
    const event = {
      kind: 'maintenance',
      at: new Date(hour(12).getTime() - 1),
      restart: true,
      text: 'new tube',
    } as const;
    await recordStreamEvent(actor, streamId, { ...event, restart: false });
    expect(await rulesOf(streamId)).toEqual(['level:eight-on-one-side']);
    await recordStreamEvent(actor, streamId, event);
    const { points, signals } = await judgementOf(streamId);
    expect(points[12]?.moving_range).toBeNull();
    expect(points[13]?.moving_range).not.toBeNull();
    expect(signals).toMatchObject([{ first: points[19]?.key, completions: 1 }]);
    await record([wafer(streamId, 20, 10.09)]);
    expect((await judgementOf(streamId)).signals).toMatchObject([{ completions: 2 }]);
  });

  it('recorded long after ends as one that was there before the wafers', async () => {
    const event = { kind: 'adjustment', at: hour(149.5), restart: true, text: 'new tube' } as const;
    const levels = (i: number) => (i >= 143 && i < 156 ? 10.08 : quietLevel(i));
    const ends = [];
    for (const isFirst of [true, false]) {
      const streamId = await settledStream();
      if (isFirst) await recordStreamEvent(actor, streamId, event);
      await record(Array.from({ length: 160 }, (_, i) => wafer(streamId, i, levels(i))));
      if (!isFirst) await recordStreamEvent(actor, streamId, event);
      ends.push(await judgementOf(streamId));
    }
    expect(ends[1]).toEqual(ends[0]);
    expect(ends[0]?.points[150]?.moving_range).toBeNull();
  });
});

describe('an excursion', () => {
  async function openCase(): Promise<{ streamId: string; id: string }> {
    const streamId = await settledStream();
    await recordInTurn([wafer(streamId, 0), wafer(streamId, 1, 10.31)]);
    const [found] = await casesOf(streamId);
    return { streamId, id: found?.id ?? '' };
  }
  const entriesOf = async (id: string) =>
    (
      await getPool().query(
        'SELECT action, actor, note FROM excursion_entry WHERE excursion_id = $1 ORDER BY id',
        [id],
      )
    ).rows;
  const close = { to: 'closed', note: 'seen', cause: 'A valve stuck' } as const;

  it('goes its way from open to closed, with who did it, and never back', async () => {
    const { id, streamId } = await openCase();
    for (const to of ['acknowledged', 'under-investigation'] as const)
      expect(await stepExcursion(actor, id, { to, note: '' })).toEqual({ ok: true });
    expect(await stepExcursion(actor, id, { to: 'noted', note: 'a look' })).toEqual({ ok: true });
    expect(await stepExcursion(actor, id, { to: 'acknowledged', note: '' })).toEqual({
      ok: false,
      reason: 'This excursion is under investigation already.',
    });
    expect(await stepExcursion(actor, id, close)).toEqual({ ok: true });
    for (const step of [
      close,
      { to: 'acknowledged', note: '' },
      { to: 'under-investigation', note: '' },
    ] as const)
      expect(await stepExcursion(actor, id, step)).toMatchObject({ ok: false });
    expect(await stepExcursion(actor, id, { to: 'noted', note: 'later' })).toEqual({ ok: true });
    expect((await entriesOf(id)).map(({ action }) => action)).toEqual([
      'opened',
      'acknowledged',
      'investigating',
      'noted',
      'closed',
      'noted',
    ]);
    const { rows } = await getPool().query(
      'SELECT state, acknowledged_by, closed_by, cause FROM excursion WHERE id = $1',
      [id],
    );
    expect(rows[0]).toEqual({
      state: 'closed',
      acknowledged_by: actor.name,
      closed_by: actor.name,
      cause: 'A valve stuck',
    });
    await expect(getPool().query('DELETE FROM excursion_entry')).rejects.toThrow('never changed');
    expect((await casesOf(streamId)).map(({ state }) => state)).toContain('closed');
  });

  it('is not there', async () => {
    expect(await stepExcursion(actor, '999999', close)).toEqual({
      ok: false,
      reason: 'There is no such excursion.',
    });
  });

  it('is taken a step by one of two people at once; the other is told', async () => {
    const { id } = await openCase();
    const answers = await Promise.all(
      Array.from({ length: 5 }, () => stepExcursion(actor, id, { to: 'acknowledged', note: '' })),
    );
    expect(answers.filter(({ ok }) => ok)).toHaveLength(1);
    expect((await entriesOf(id)).filter(({ action }) => action === 'acknowledged')).toHaveLength(1);
  });

  it('that was closed stays closed: what signals next is a case of its own', async () => {
    const { id, streamId } = await openCase();
    await record([wafer(streamId, 2, 10.32)]);
    const before = (await casesOf(streamId)).length;
    await stepExcursion(actor, id, close);
    await record([wafer(streamId, 3, 10.33)]);
    const after = await casesOf(streamId);
    expect(after.length).toBe(before + 1);
    expect(after.find((one) => one.id === id)?.state).toBe('closed');
    expect(after.at(-1)).toMatchObject({ chart: 'level', state: 'open' });
  });

  it('can be stepped while wafers that belong to it are recorded, without one waiting for the other for ever', async () => {
    const cases = await Promise.all(Array.from({ length: 8 }, openCase));
    for (const to of ['acknowledged', 'under-investigation'] as const) {
      const answers = await Promise.all(
        cases.flatMap(({ id, streamId }, i) => [
          record([wafer(streamId, to === 'acknowledged' ? 2 : 3, 10.31 + i / 1000)]).then(() => ({
            ok: true,
          })),
          stepExcursion(actor, id, { to, note: '' }),
        ]),
      );
      expect(answers.every(({ ok }) => ok)).toBe(true);
    }
  });
});
