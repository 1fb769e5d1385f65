import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { getPool } from '@/lib/database/client';
import type { Measurement } from '@/lib/maps/types';
import { freshDatabase, type FreshDatabase } from '../support/fresh-database';
import {
  casesOf,
  judgementOf,
  newStream,
  quietLevel,
  record,
  recordInTurn,
  rowCounts,
  rulesOf,
  settleLimits,
  START,
  wafer,
} from '../support/store-line';

let database: FreshDatabase;

beforeAll(async () => {
  database = await freshDatabase();
});

afterAll(() => database.drop());

/** Levels with a run on one side, a far one and a return: most rules find something. */
const eventful = (i: number) =>
  i === 22 ? 10.5 : i >= 30 && i < 42 ? 10.08 + 0.001 * i : i === 50 ? 9.5 : quietLevel(i);
const wafers = (streamId: string, count: number) =>
  Array.from({ length: count }, (_, i) => wafer(streamId, i, eventful(i)));

async function settledStream(): Promise<string> {
  const { id } = await newStream();
  await settleLimits(id);
  return id;
}

/** The same order every time, with all kinds of delays. */
function shuffled<T>(list: readonly T[]): T[] {
  return list
    .map((one, i) => ({ one, turn: (i * 7919 + 13) % 61 }))
    .sort((a, b) => a.turn - b.turn)
    .map(({ one }) => one);
}

function cut<T>(list: readonly T[], sizes: readonly number[]): T[][] {
  const parts: T[][] = [];
  for (let i = 0, turn = 0; i < list.length; i += sizes[turn++ % sizes.length] ?? 1)
    parts.push(list.slice(i, i + (sizes[turn % sizes.length] ?? 1)));
  return parts;
}

describe('a measurement', () => {
  it('is recorded once, reported as repeated after that, and refused with another content', async () => {
    const streamId = await settledStream();
    const first = wafer(streamId, 0);
    expect(await record([first])).toMatchObject([{ kind: 'recorded' }]);
    expect(await record([wafer(streamId, 0)])).toEqual([{ kind: 'repeated' }]);
    const changed = { ...first, readings: first.readings.map((value) => (value ?? 0) + 1) };
    expect(await record([changed])).toMatchObject([
      { kind: 'refused', reason: expect.stringContaining('another content') },
    ]);
    expect(await record([wafer(streamId, 1), changed, wafer(streamId, 0), wafer(streamId, 1)])).toMatchObject(
      [{ kind: 'recorded' }, { kind: 'refused' }, { kind: 'repeated' }, { kind: 'repeated' }],
    );
    const { points } = await judgementOf(streamId);
    expect(points.map(({ wafers }) => wafers)).toEqual([['W0000'], ['W0001']]);
  });

  it('of the same wafer at another time, in another run or stream is another', async () => {
    const [one, two] = [await settledStream(), await settledStream()];
    const again = { ...wafer(one, 0), facts: { ...wafer(one, 0).facts, measuredAt: new Date(START + 1) } };
    const outcomes = await record([wafer(one, 0), again, wafer(one, 0, 10, { run: 'R1' }), wafer(two, 0)]);
    expect(outcomes.map(({ kind }) => kind)).toEqual(['recorded', 'recorded', 'recorded', 'recorded']);
  });

  it('keeps its readings as they were sent, to the last digit', async () => {
    const streamId = await settledStream();
    const sent = {
      ...wafer(streamId, 0),
      readings: [0.1 + 0.2, null, NaN, -1, 0, 1e-320, 1 / 3, 123456789.12345679, 1e100],
    };
    await record([sent]);
    const { rows } = await getPool().query<{ reading: number[] }>(
      'SELECT reading FROM wafer_reading WHERE stream_id = $1',
      [streamId],
    );
    expect(rows[0]?.reading).toEqual(sent.readings);
  });

  it('with words of any kind comes back as it was sent', async () => {
    const streamId = await settledStream();
    const words = {
      wafer: `a"b\\c{d},'e', NULL`,
      note: 'two\nlines\tü€\u{1F600}',
      gauge: 'NULL',
      operator: ' ',
    };
    await record([wafer(streamId, 0, 10, words), wafer(streamId, 1)]);
    const { rows } = await getPool().query(
      'SELECT wafer, note, gauge, operator FROM wafer_measurement WHERE stream_id = $1 ORDER BY id',
      [streamId],
    );
    expect(rows[0]).toEqual(words);
  });
});

describe('wafers of one stream', () => {
  it('one by one, all at once and in batches end alike, first limits and cases among it', async () => {
    const ends = [];
    for (const sizes of [[1], [70], [3, 1, 8]]) {
      const { id } = await newStream();
      for (const part of cut(wafers(id, 70), sizes)) await record(part);
      const cases = (await casesOf(id)).map(({ chart, family, state }) => ({ chart, family, state }));
      ends.push({ ...(await judgementOf(id)), cases });
    }
    expect(ends[1]).toEqual(ends[0]);
    expect(ends[2]).toEqual(ends[0]);
    expect(ends[0]?.signals.length).toBeGreaterThan(1);
    expect(ends[0]?.points.filter(({ revision }) => revision === 1)).toHaveLength(45);
  });

  it('in any order of arrival give the same points and signals, given their limits', async () => {
    const inOrder = await settledStream();
    await recordInTurn(wafers(inOrder, 60));
    const expected = await judgementOf(inOrder);
    expect(expected.signals.map(({ rule }) => rule)).toEqual(
      expect.arrayContaining(['beyond-3-sigma', 'eight-on-one-side']),
    );
    for (const sizes of [[1], [7, 1, 2]]) {
      const late = await settledStream();
      for (const part of cut(shuffled(wafers(late, 60)), sizes)) await record(part);
      expect(await judgementOf(late)).toEqual(expected);
    }
  });

  it('that arrive long after 200 others are judged at their place', async () => {
    const [inOrder, late] = [await settledStream(), await settledStream()];
    const all = (id: string) => wafers(id, 200);
    await record(all(inOrder));
    await record(all(late).filter((_, i) => i !== 22 && i !== 35));
    await recordInTurn(all(late).filter((_, i) => i === 35 || i === 22));
    expect(await judgementOf(late)).toEqual(await judgementOf(inOrder));
  });
});

describe('many writers at once', () => {
  it('on one stream lose nothing, never hang, and end as one writer does', async () => {
    const [alone, together] = [await settledStream(), await settledStream()];
    await recordInTurn(wafers(alone, 60));
    const outcomes = await Promise.all(wafers(together, 60).map((one) => record([one])));
    expect(outcomes.flat().every(({ kind }) => kind === 'recorded')).toBe(true);
    expect(await judgementOf(together)).toEqual(await judgementOf(alone));
  });

  it('in batches over two streams, in either order of the two, end as one writer does', async () => {
    const [a, b, c, d] = [
      await settledStream(),
      await settledStream(),
      await settledStream(),
      await settledStream(),
    ];
    await record([...wafers(a, 60), ...wafers(b, 60)]);
    const batches = cut(
      wafers(c, 60).flatMap((one, i) => (i % 2 === 0 ? [one, wafers(d, 60)[i]!] : [wafers(d, 60)[i]!, one])),
      [5, 2, 1],
    );
    await Promise.all(batches.map((batch) => record(batch)));
    expect(await judgementOf(c)).toEqual(await judgementOf(a));
    expect(await judgementOf(d)).toEqual(await judgementOf(b));
  });

  it('of the same measurement record it once', async () => {
    const streamId = await settledStream();
    const outcomes = await Promise.all(Array.from({ length: 12 }, () => record([wafer(streamId, 0)])));
    const kinds = outcomes.flat().map(({ kind }) => kind);
    expect(kinds.filter((kind) => kind === 'recorded')).toHaveLength(1);
    expect(kinds.filter((kind) => kind === 'repeated')).toHaveLength(11);
  });
});

describe('a batch that fails', () => {
  const broken = (streamId: string): Measurement => wafer(streamId, 9, 10, { ingotFraction: 2 });

  it('leaves nothing behind, and the stream as fit as before', async () => {
    const streamId = await settledStream();
    await recordInTurn(wafers(streamId, 5));
    const before = [await rowCounts(), await judgementOf(streamId)];
    await expect(record([...wafers(streamId, 8), broken(streamId)])).rejects.toThrow('ingot_fraction');
    await expect(record([broken(streamId)])).rejects.toThrow('ingot_fraction');
    expect([await rowCounts(), await judgementOf(streamId)]).toEqual(before);
    const [other] = [await settledStream()];
    await recordInTurn(wafers(streamId, 8));
    await record(wafers(other, 8));
    expect(await judgementOf(streamId)).toEqual(await judgementOf(other));
  });
});

describe('what was measured', () => {
  it('is never changed or deleted, whoever asks', async () => {
    const streamId = await settledStream();
    await record([wafer(streamId, 0)]);
    for (const statement of [
      'UPDATE wafer_reading SET reading[1] = 1',
      'DELETE FROM wafer_reading',
      'TRUNCATE wafer_reading',
    ])
      await expect(getPool().query(statement)).rejects.toThrow('never changed or deleted');
  });
});

describe('subgroups of several wafers', () => {
  const run = (streamId: string, i: number, name: string, level: number) =>
    wafer(streamId, i, level, { run: name, wafer: `${name}-${i}` });

  it('wait for their wafers as the newest, and are judged when whole or followed', async () => {
    const { id } = await newStream({ subgroup: 'run', subgroupSize: 3 });
    await settleLimits(id);
    const states = async () =>
      (await judgementOf(id)).points.map(({ key, state, level }) => [key, state, level]);
    await record([run(id, 0, 'R1', 10.6)]);
    expect(await states()).toEqual([['R1', 'open', expect.closeTo(10.6, 9)]]);
    expect(await rulesOf(id)).toEqual([]);
    await recordInTurn([run(id, 1, 'R1', 10.2), run(id, 2, 'R1', 10.4)]);
    expect(await states()).toEqual([['R1', 'judged', expect.closeTo(10.4, 9)]]);
    expect(await rulesOf(id)).toEqual(['level:beyond-3-sigma']);
    await record([run(id, 3, 'R2', 10)]);
    await record([run(id, 4, 'R3', 10)]);
    expect((await states()).map(([, state]) => state)).toEqual(['judged', 'judged', 'open']);
  });

  it('end alike whether their wafers come one by one, at once, or late', async () => {
    const ends = [];
    for (const order of ['in turn', 'at once', 'late']) {
      const { id } = await newStream({ subgroup: 'lot', subgroupSize: 3 });
      await settleLimits(id);
      const all = Array.from({ length: 240 }, (_, i) =>
        wafer(id, i, eventful(Math.floor(i / 3)), {
          lot: `L${String(Math.floor(i / 3)).padStart(3, '0')}`,
          wafer: `${i % 3}`,
        }),
      );
      if (order === 'in turn') await recordInTurn(all);
      else if (order === 'at once') await record(all);
      else {
        await record(all.filter((_, i) => i !== 4 && i !== 66));
        await recordInTurn(all.filter((_, i) => i === 4 || i === 66));
      }
      ends.push(await judgementOf(id));
    }
    expect(ends[1]).toEqual(ends[0]);
    expect(ends[2]).toEqual(ends[0]);
    expect(ends[0]?.signals.length).toBeGreaterThan(0);
  });
});

describe('specification and history', () => {
  it('makes a wafer out of specification a signal and a case of its own', async () => {
    const { id } = await newStream({}, { meanUpper: 10.2 });
    await settleLimits(id);
    await recordInTurn([wafer(id, 0), wafer(id, 1, 10.25), wafer(id, 2, 10.25), wafer(id, 3)]);
    const { signals, points } = await judgementOf(id);
    expect(signals.filter(({ chart }) => chart === 'specification')).toMatchObject([
      {
        rule: 'wafer-mean',
        side: 'above',
        completions: 2,
        first: points[1]?.key,
        last: points[2]?.key,
        revision: null,
      },
    ]);
    expect((await casesOf(id)).map(({ family }) => family)).toContain('specification');
  });

  it('records old wafers that signal, but opens no case for them; the next new wafer does', async () => {
    const { id } = await newStream();
    await settleLimits(id);
    await record([wafer(id, 0), wafer(id, 1, 11), wafer(id, 2)], true);
    expect(await rulesOf(id)).toContain('level:beyond-3-sigma');
    expect(await casesOf(id)).toEqual([]);
    await record([wafer(id, 30, 11)]);
    expect((await casesOf(id)).map(({ chart }) => chart)).toContain('level');
  });

  it('draws the first limits from old wafers as from any', async () => {
    const { id } = await newStream();
    await record(wafers(id, 25), true);
    await record([wafer(id, 25, 11)]);
    const { points } = await judgementOf(id);
    expect(points.map(({ revision }) => revision)).toEqual([...Array.from({ length: 25 }, () => null), 1]);
    expect(points.filter(({ history }) => history)).toHaveLength(25);
    expect((await casesOf(id)).length).toBeGreaterThan(0);
  });
});
