import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { getPool } from '@/lib/database/client';
import { listBoardStreams, listWafersToMeasure } from '@/lib/excursions/data';
import { decideReading } from '@/lib/maps/mutations';
import type { Measurement } from '@/lib/maps/types';
import { freshDatabase, type FreshDatabase } from '../support/fresh-database';
import {
  actor,
  hour,
  judgementOf,
  newStream,
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

const AGAIN = 'measured again; the first measurement is charted';

async function lotStream(): Promise<string> {
  const { id } = await newStream({ subgroup: 'lot', subgroupSize: 2 }, { meanUpper: 10.5 });
  await settleLimits(id);
  return id;
}

/** A wafer of lot L1 processed at hour 0 and measured at an hour; half its readings may be missing. */
function measured(streamId: string, name: string, at: number, level: number, isWhole = true): Measurement {
  const one = wafer(streamId, at, level, {
    lot: 'L1',
    wafer: name,
    processedAt: hour(0),
    measuredAt: hour(at),
  });
  return isWhole
    ? one
    : { ...one, readings: one.readings.map((value, site) => (site % 2 === 0 ? value : null)) };
}

const standing = async (streamId: string) =>
  (
    await getPool().query<{ wafer: string; hour: number; level: number | null; reason: string | null }>(
      `SELECT w.wafer, (extract(epoch FROM w.measured_at - $2) / 3600)::integer AS hour, w.level,
         w.not_judged_reason AS reason, w.specification
       FROM wafer_measurement w WHERE w.stream_id = $1 ORDER BY w.wafer, w.measured_at`,
      [streamId, hour(0)],
    )
  ).rows;

function permutations<T>(list: readonly T[]): T[][] {
  if (list.length < 2) return [[...list]];
  return list.flatMap((one, i) => permutations(list.filter((_, j) => j !== i)).map((rest) => [one, ...rest]));
}

describe('a wafer of a lot that is measured again', () => {
  it('counts once: the first measurement is charted, the second recorded with the reason', async () => {
    const id = await lotStream();
    await recordInTurn([measured(id, 'A', 1, 10.1), measured(id, 'A', 2, 11), measured(id, 'B', 3, 10.2)]);
    const { points } = await judgementOf(id);
    expect(points).toMatchObject([{ state: 'judged', level: expect.closeTo(10.15, 9), specification: null }]);
    expect(await rulesOf(id)).toEqual([]);
    expect(await standing(id)).toMatchObject([
      { hour: 1, level: expect.closeTo(10.1, 9), reason: null },
      { hour: 2, level: null, reason: AGAIN, specification: [] },
      { hour: 3, reason: null },
    ]);
  });

  it('stands with the measurement that can be judged, where the first cannot', async () => {
    const id = await lotStream();
    await recordInTurn([measured(id, 'A', 1, 10.1, false), measured(id, 'B', 2, 10.2)]);
    const span = { from: hour(0), to: hour(9), most: 9 };
    expect(await listWafersToMeasure(actor, id, span)).toHaveLength(1);
    await record([measured(id, 'A', 3, 10.4)]);
    await record([measured(id, 'A', 4, 10.9)]);
    expect((await judgementOf(id)).points).toMatchObject([
      { level: expect.closeTo(10.3, 9), wafers: ['A', 'B'] },
    ]);
    expect((await standing(id)).map(({ reason }) => reason === null)).toEqual([false, true, false, true]);
    expect(await listWafersToMeasure(actor, id, span)).toEqual([]);
    const board = (await listBoardStreams(actor)).find((stream) => stream.id === id);
    expect(board?.toMeasureAgain).toEqual([]);
  });

  it('is not listed to be measured again, which another wafer of its lot is', async () => {
    const id = await lotStream();
    await recordInTurn([
      measured(id, 'A', 1, 10.1),
      measured(id, 'A', 2, 10.3),
      measured(id, 'A', 3, 10.3, false),
      measured(id, 'B', 4, 10.2, false),
    ]);
    const span = await listWafersToMeasure(actor, id, { from: hour(0), to: hour(9), most: 9 });
    const board = (await listBoardStreams(actor)).find((stream) => stream.id === id);
    for (const list of [span, board?.toMeasureAgain]) expect(list?.map((one) => one.wafer)).toEqual(['B']);
  });

  it('stands alike in whatever order its measurements arrive, one by one or at once', async () => {
    const all = (id: string) => [
      measured(id, 'A', 1, 10.9, false),
      measured(id, 'A', 2, 10.1),
      measured(id, 'A', 3, 10.6),
      measured(id, 'B', 4, 10.3),
    ];
    const inOrder = await lotStream();
    await recordInTurn(all(inOrder));
    const expected = [await judgementOf(inOrder), await standing(inOrder)];
    expect((await judgementOf(inOrder)).points).toMatchObject([
      { level: expect.closeTo(10.2, 9), state: 'judged' },
    ]);
    for (const order of permutations([0, 1, 2, 3])) {
      const id = await lotStream();
      const wafers = order.map((i) => all(id)[i]!);
      if (order[0] === 3) await record(wafers);
      else await recordInTurn(wafers);
      expect([await judgementOf(id), await standing(id)]).toEqual(expected);
    }
  });

  it('gives its place up when a person takes the first out of judgement, and takes it back with it', async () => {
    const id = await lotStream();
    await recordInTurn([measured(id, 'A', 1, 10.1), measured(id, 'A', 2, 10.3), measured(id, 'B', 3, 10.2)]);
    const before = [await judgementOf(id), await standing(id)];
    const { rows } = await getPool().query<{ id: string }>(
      "SELECT id FROM wafer_measurement WHERE stream_id = $1 AND wafer = 'A' ORDER BY measured_at",
      [id],
    );
    const decide = (of: number, siteIndex: number, action: 'in' | 'out') =>
      decideReading(actor, id, rows[of]!.id, { siteIndex, action, reason: 'a scratch' });
    for (const site of [0, 1]) expect(await decide(0, site, 'out')).toEqual({ ok: true });
    expect((await judgementOf(id)).points).toMatchObject([{ level: expect.closeTo(10.25, 9) }]);
    expect((await standing(id)).map(({ reason }) => reason === null)).toEqual([false, true, true]);
    for (const site of [0, 1]) await decide(0, site, 'in');
    expect([await judgementOf(id), await standing(id)]).toEqual(before);
    await decide(1, 0, 'out');
    expect(await judgementOf(id)).toEqual(before[0]);
    expect((await standing(id))[1]).toMatchObject({ level: null, reason: AGAIN });
  });

  it('after it was processed again counts as another', async () => {
    const id = await lotStream();
    const reworked = measured(id, 'A', 6, 10.4);
    await recordInTurn([
      measured(id, 'A', 1, 10.1),
      { ...reworked, facts: { ...reworked.facts, processedAt: hour(5) } },
    ]);
    expect((await judgementOf(id)).points).toMatchObject([
      { state: 'judged', level: expect.closeTo(10.25, 9) },
    ]);
  });
});

describe('a monitor wafer that comes back where each wafer is a point', () => {
  it('is a new measurement', async () => {
    const { id } = await newStream();
    await settleLimits(id);
    await recordInTurn([0, 1].map((i) => wafer(id, i, undefined, { wafer: 'M1', processedAt: hour(0) })));
    expect((await judgementOf(id)).points.map(({ state }) => state)).toEqual(['judged', 'judged']);
  });
});
