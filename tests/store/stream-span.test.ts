import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { programActor } from '@/lib/access/local-actor';
import { getPool } from '@/lib/database/client';
import { takeIds } from '@/lib/database/take-ids';
import {
  findStreamSpan,
  findStreamStanding,
  listSpanWafers,
  listWafersToMeasure,
} from '@/lib/excursions/data';
import type { SpanWish } from '@/lib/excursions/span-points';
import { recordMeasurements } from '@/lib/maps/record-measurements';
import { CORRECTIONS, type Measurement } from '@/lib/maps/types';
import { createSitePlan, createStream } from '@/lib/streams/mutations';
import { type FreshDatabase, freshDatabase } from '../support/fresh-database';

const actor = programActor();
const start = Date.parse('2031-04-05T00:00:00Z');
const minute = 60_000;
const now = new Date(start + 1000 * minute);
const sites = [0, 1, 2, 3, 4].map((nth) => ({ xMm: nth * 10, yMm: 0 }));
const usual: SpanWish = { from: null, to: null, around: null, gauge: null, lot: null };

let database: FreshDatabase;
let streamId = '';

function measurement(nth: number, over: Partial<Measurement['facts']> = {}): Measurement {
  const at = new Date(start + nth * minute);
  const level = 10 + Math.sin(nth * nth) / 10;
  return {
    streamId,
    readings: [0.99, 1, 1.01, 1.005, 0.995].map((share) => share * level),
    facts: {
      lot: `M${Math.floor(nth / 25)}`,
      run: null,
      wafer: String(nth % 25),
      slot: null,
      measuredAt: at,
      processedAt: at,
      stage: null,
      tool: null,
      chamber: null,
      recipe: null,
      gauge: nth % 2 === 0 ? 'Gauge 1' : 'Gauge 2',
      operator: null,
      temperatureC: null,
      thicknessUm: null,
      ingotFraction: null,
      correctionsApplied: [...CORRECTIONS],
      note: null,
      ...over,
    },
  };
}

async function record(measurements: readonly Measurement[]): Promise<void> {
  const [id = ''] = await takeIds(getPool(), 'intake_batch', 1);
  const batch = { id, source: 'test', origin: 'command', history: false, actor: actor.name } as const;
  await recordMeasurements(actor, batch, [...measurements]);
}

function valueOf(result: { ok: true; value: string } | { ok: false; reason: string }): string {
  if (!result.ok) throw new Error(result.reason);
  return result.value;
}

beforeAll(async () => {
  database = await freshDatabase();
  const plan = { name: 'five', diameterMm: 200, edgeExclusionMm: 3, orientation: 'notch' as const, sites };
  const settings = {
    slug: 'a-stream',
    name: 'A stream',
    kind: 'epi',
    step: 'Epitaxy',
    tool: 'Reactor 1',
    chamber: '',
    recipe: 'R',
    quantity: 'resistivity',
    subgroup: 'wafer',
    subgroupSize: 1,
    controlStatistic: 'mean',
    chartedValue: 'statistic',
    screening: 'impossible',
    repeatabilityPercent: 0.2,
    sitePlanId: valueOf(await createSitePlan(actor, plan)),
  } as const;
  streamId = valueOf(await createStream(actor, settings, null, null));
  await record(Array.from({ length: 300 }, (_, nth) => measurement(nth)));
});

afterAll(() => database.drop());

describe('a stretch of a stream', () => {
  it('is its last 200 subgroups in order where nobody asked for another', async () => {
    const span = await findStreamSpan(actor, streamId, usual);
    expect(span.points.map((point) => point.at)).toEqual(
      Array.from({ length: 200 }, (_, nth) => start + (100 + nth) * minute),
    );
    expect(span.whole).toEqual({ from: new Date(start), to: new Date(start + 299 * minute) });
    expect(span.isCut).toBe(false);
  });

  it('holds both its ends', async () => {
    const [from, to] = [new Date(start + 10 * minute), new Date(start + 12 * minute)];
    const span = await findStreamSpan(actor, streamId, { ...usual, from, to });
    expect(span.points.map((point) => (point.at - start) / minute)).toEqual([10, 11, 12]);
  });

  it('ends where it is told to, and goes on to the newest from where it begins', async () => {
    const to = new Date(start + 49 * minute);
    expect((await findStreamSpan(actor, streamId, { ...usual, to })).points).toHaveLength(50);
    const from = new Date(start + 50 * minute);
    expect((await findStreamSpan(actor, streamId, { ...usual, from })).points).toHaveLength(250);
  });

  it('lies about a subgroup that is older than the newest ones', async () => {
    const all = await findStreamSpan(actor, streamId, { ...usual, from: new Date(start) });
    const [early, late] = [all.points[60], all.points[250]];
    const about = await findStreamSpan(actor, streamId, { ...usual, around: early?.id ?? '' });
    expect(about.points.map((point) => point.id)).toEqual(all.points.slice(0, 111).map((point) => point.id));
    const newest = await findStreamSpan(actor, streamId, { ...usual, around: late?.id ?? '' });
    expect(newest.points.at(-1)?.id).toBe(all.points.at(-1)?.id);
    const nowhere = await findStreamSpan(actor, streamId, { ...usual, around: '999999999' });
    expect(nowhere.points).toHaveLength(200);
  });

  it('keeps what matches gauge and lot, and counts what it holds', async () => {
    const gauge = await findStreamSpan(actor, streamId, { ...usual, gauge: 'Gauge 1' });
    expect([gauge.points.length, gauge.inSpan]).toEqual([100, 200]);
    const lot = await findStreamSpan(actor, streamId, { ...usual, gauge: 'Gauge 1', lot: 'M11' });
    expect(lot.points).toHaveLength(12);
    expect((await findStreamSpan(actor, streamId, { ...usual, lot: "M11'" })).points).toEqual([]);
  });

  it('is empty in a stream without wafers', async () => {
    expect(await findStreamSpan(actor, '999999', usual)).toEqual({
      points: [],
      inSpan: 0,
      isCut: false,
      whole: null,
    });
  });
});

describe('the wafers of a stretch', () => {
  it('come with what was measured, in the order of processing', async () => {
    const to = new Date(start + 2 * minute);
    const { points } = await findStreamSpan(actor, streamId, { ...usual, to });
    const wafers = await listSpanWafers(
      actor,
      streamId,
      points.map((point) => point.id),
    );
    expect(wafers.map((wafer) => [wafer.wafer, wafer.gauge, wafer.sites, wafer.isMeasuredAgain])).toEqual([
      ['0', 'Gauge 1', 5, false],
      ['1', 'Gauge 2', 5, false],
      ['2', 'Gauge 1', 5, false],
    ]);
    expect(wafers[1]?.value).toBeCloseTo(10 + Math.sin(1) / 10, 12);
    expect(await listSpanWafers(actor, streamId, [])).toEqual([]);
  });
});

describe('how a stream stands', () => {
  it('tells the limits in force, what was judged by them, and their baseline', async () => {
    const standing = await findStreamStanding(actor, streamId, now);
    expect(standing.inForce?.revision).toBe(1);
    expect(standing.since.subgroups).toBe(275);
    expect(standing.baselineLevels).toHaveLength(25);
    expect(standing.baselineLevels[1]).toBeCloseTo(10 + Math.sin(1) / 10, 12);
    expect(await findStreamStanding(actor, '999999', now)).toMatchObject({
      inForce: null,
      cases: [],
      openCases: 0,
      since: { subgroups: 0, withSignal: 0 },
    });
  });

  it('names a case that is open, and since when its signal goes on', async () => {
    const step = Array.from({ length: 9 }, (_, nth) => measurement(300 + nth)).map((one) => ({
      ...one,
      readings: one.readings.map((reading) => (reading ?? 0) * 1.2),
    }));
    await record(step);
    const standing = await findStreamStanding(actor, streamId, now);
    expect(standing.openCases).toBe(standing.cases.length);
    const signal = standing.cases.find((one) => one.signal?.rule === 'eight-on-one-side')?.signal;
    expect(signal?.last.isNewest).toBe(true);
    expect(signal?.first.key).toMatch(/^M\d+\/\d+\//);
  });

  it('lists a wafer to be measured again until that was done', async () => {
    const bad = measurement(400, { wafer: 'bad' });
    await record([{ ...bad, readings: [10, null, null, null, null] }]);
    const span = { from: new Date(start), to: new Date(start + 500 * minute), most: 20 };
    const waiting = await listWafersToMeasure(actor, streamId, span);
    expect(waiting.map((wafer) => wafer.wafer)).toEqual(['bad']);
    expect((await findStreamSpan(actor, streamId, usual)).points.at(-1)).toMatchObject({
      state: 'not-judged',
      level: null,
    });
    const at = new Date(start + 401 * minute);
    await record([measurement(401, { wafer: 'bad', lot: bad.facts.lot, measuredAt: at })]);
    expect(await listWafersToMeasure(actor, streamId, span)).toEqual([]);
    const newest = (await findStreamSpan(actor, streamId, usual)).points.at(-1)?.id ?? '';
    expect((await listSpanWafers(actor, streamId, [newest]))[0]?.isMeasuredAgain).toBe(true);
  });
});
