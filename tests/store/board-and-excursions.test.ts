import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { programActor } from '@/lib/access/local-actor';
import { getPool } from '@/lib/database/client';
import { takeIds } from '@/lib/database/take-ids';
import { caseAnswer } from '@/lib/excursions/case-answer';
import { boardRows } from '@/lib/excursions/board-rows';
import { findExcursion, listBoardStreams, listExcursions } from '@/lib/excursions/data';
import { stepExcursion } from '@/lib/excursions/mutations';
import { recordMeasurements } from '@/lib/maps/record-measurements';
import { CORRECTIONS, type Measurement } from '@/lib/maps/types';
import type { Target } from '@/lib/physics/target';
import { createSitePlan, createStream, retireStream } from '@/lib/streams/mutations';
import { type FreshDatabase, freshDatabase } from '../support/fresh-database';

const actor = programActor();
const start = Date.parse('2031-04-05T00:00:00Z');
const minute = 60_000;
const sites = [0, 1, 2, 3, 4].map((nth) => ({ xMm: nth * 10, yMm: 0 }));
const boron: Target = {
  quantity: 'resistivity',
  dopant: 'boron',
  densityPerCm3: 1.33e15,
  tolerancePercent: 5,
  alongCrystal: false,
  profile: 'uniform',
  lengthUm: null,
  backgroundDopant: null,
  backgroundDensityPerCm3: null,
  calibrationFactor: null,
  calibrationPercent: null,
};

let database: FreshDatabase;
const streams = { steady: '', moved: '', empty: '', retired: '' };

function measurement(
  streamId: string,
  nth: number,
  level: number,
  over: Partial<Measurement> = {},
): Measurement {
  const at = new Date(start + nth * minute);
  return {
    streamId,
    readings: [-2, 0, 2, 1, -1].map((share) => level * (1 + (share * (1 + Math.sin(nth * nth) / 5)) / 200)),
    facts: {
      lot: null,
      run: `R${nth}`,
      wafer: '01',
      slot: null,
      measuredAt: at,
      processedAt: at,
      stage: null,
      tool: null,
      chamber: null,
      recipe: null,
      gauge: null,
      operator: null,
      temperatureC: null,
      thicknessUm: null,
      ingotFraction: null,
      correctionsApplied: [...CORRECTIONS],
      note: null,
    },
    ...over,
  };
}

async function record(...measurements: Measurement[]): Promise<void> {
  const [id = ''] = await takeIds(getPool(), 'intake_batch', 1);
  const batch = { id, source: 'test', origin: 'command', history: false, actor: actor.name } as const;
  await recordMeasurements(actor, batch, measurements);
}

function valueOf(result: { ok: true; value: string } | { ok: false; reason: string }): string {
  if (!result.ok) throw new Error(result.reason);
  return result.value;
}

const board = async () => new Map((await listBoardStreams(actor)).map((stream) => [stream.slug, stream]));
const all = { state: 'all', stream: null, skip: 0, most: 50 } as const;

beforeAll(async () => {
  database = await freshDatabase();
  const plan = { name: 'five', diameterMm: 200, edgeExclusionMm: 3, orientation: 'notch' as const, sites };
  const sitePlanId = valueOf(await createSitePlan(actor, plan));
  for (const slug of ['steady', 'moved', 'empty', 'retired'] as const) {
    const settings = {
      slug,
      name: `Stream ${slug}`,
      kind: 'substrate',
      step: 'Growth',
      tool: 'Puller',
      chamber: '',
      recipe: 'R',
      quantity: 'resistivity',
      subgroup: 'run',
      subgroupSize: 1,
      controlStatistic: 'mean',
      chartedValue: 'statistic',
      screening: 'impossible',
      repeatabilityPercent: 0.2,
      sitePlanId,
    } as const;
    streams[slug] = valueOf(await createStream(actor, settings, slug === 'empty' ? null : boron, null));
  }
  await retireStream(actor, streams.retired, true);
  const level = (nth: number) => 10 + Math.sin(nth * nth) / 10;
  for (const id of [streams.steady, streams.moved]) {
    await record(...Array.from({ length: 40 }, (_, nth) => measurement(id, nth, level(nth))));
  }
  await record(measurement(streams.moved, 40, 12));
});

afterAll(() => database.drop());

describe('the board', () => {
  it('shows every stream in use with its last 30 subgroups, oldest first', async () => {
    const found = await board();
    expect([...found.keys()].sort()).toEqual(['empty', 'moved', 'steady']);
    expect(found.get('steady')?.points).toHaveLength(30);
    expect(found.get('moved')?.points.at(-1)?.level).toBeCloseTo(12, 1);
    expect(found.get('moved')?.newest).toMatchObject({ wafer: '01', runOrLot: 'R40' });
    expect(found.get('empty')).toMatchObject({
      points: [],
      limits: [],
      newest: null,
      worst: null,
      target: null,
    });
  });

  it('puts the stream with a case first, and says what happened', async () => {
    const rows = boardRows(await listBoardStreams(actor));
    expect(rows[0]?.stream.slug).toBe('moved');
    expect(rows[0]?.state).toEqual({ group: 'needs-someone', words: expect.stringMatching(/upper limit$/) });
    expect(rows[0]?.size).toBeGreaterThan(3);
    expect(rows[0]?.expected?.differencePercent).toBeGreaterThan(15);
    expect(rows[0]?.stream.openCases).toBe(rows[0]?.stream.unansweredCases);
  });

  it('asks for a wafer without a value to be measured again, until that was done', async () => {
    await record(measurement(streams.steady, 41, 10, { readings: [null, null, null, null, 10] }));
    const before = (await board()).get('steady');
    expect(before?.toMeasureAgain).toMatchObject([{ wafer: '01', runOrLot: 'R41' }]);
    expect(before?.points.at(-1)).toMatchObject({ state: 'not-judged', level: null });
    const again = measurement(streams.steady, 41, 10);
    again.facts.measuredAt = new Date(start + 50 * minute);
    await record(again);
    expect((await board()).get('steady')?.toMeasureAgain).toEqual([]);
  });
});

describe('excursions', () => {
  it('are listed by state and stream, with counts and streams', async () => {
    const list = await listExcursions(actor, all);
    expect(list.excursions.length).toBeGreaterThan(0);
    expect(list.excursions.every((one) => one.stream.slug === 'moved' && one.last.key === 'R40')).toBe(true);
    expect(list.streams).toEqual([{ slug: 'moved', name: 'Stream moved' }]);
    expect(list.counts.open).toBe(list.excursions.length);
    expect((await listExcursions(actor, { ...all, state: 'closed' })).excursions).toEqual([]);
    expect((await listExcursions(actor, { ...all, stream: 'steady' })).excursions).toEqual([]);
    expect((await listExcursions(actor, { ...all, skip: 1000 })).excursions).toEqual([]);
  });

  it('tell their signals, the subgroups about them and their log', async () => {
    const { excursions } = await listExcursions(actor, all);
    const id = excursions.find((one) => one.chart === 'level')?.id ?? '';
    const found = await findExcursion(actor, id);
    expect(found && caseAnswer(found)).toBe('Stream moved: beyond the upper limit, at run R40');
    expect(found?.points.map((point) => point.key)).toEqual(
      Array.from({ length: 21 }, (_, nth) => `R${20 + nth}`),
    );
    expect(found?.signals[0]?.first.wafers).toMatchObject([{ wafer: '01', runOrLot: 'R40' }]);
    expect(found?.limits).toMatchObject([{ revision: 1, state: 'provisional' }]);
    expect(found?.entries).toMatchObject([{ action: 'opened', note: 'beyond the upper limit' }]);
  });

  it('leave the board and the list once they are closed, and keep who did what', async () => {
    const { excursions } = await listExcursions(actor, all);
    for (const { id } of excursions) {
      await stepExcursion(actor, id, { to: 'acknowledged', note: 'seen' });
      expect(await stepExcursion(actor, id, { to: 'acknowledged', note: '' })).toMatchObject({ ok: false });
      await stepExcursion(actor, id, { to: 'closed', note: '', cause: 'misrouted' });
    }
    expect((await board()).get('moved')).toMatchObject({
      worst: null,
      openCases: 0,
      oldestUnansweredAt: null,
    });
    expect((await listExcursions(actor, { ...all, state: 'unclosed' })).excursions).toEqual([]);
    const found = await findExcursion(actor, excursions[0]?.id ?? '');
    expect(found).toMatchObject({ state: 'closed', cause: 'misrouted', closedBy: actor.name });
    expect(found?.entries.map((entry) => entry.action)).toEqual(['opened', 'acknowledged', 'closed']);
  });

  it('are not found by what is no number, or by one that was never given', async () => {
    for (const id of ['', 'x', '1e3', '-1', '999999', '9'.repeat(30)]) {
      expect(await findExcursion(actor, id)).toBeNull();
    }
  });
});
