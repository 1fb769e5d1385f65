import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { programActor } from '@/lib/access/local-actor';
import { getPool } from '@/lib/database/client';
import { takeIds } from '@/lib/database/take-ids';
import { findWafer } from '@/lib/maps/data';
import { decideReading } from '@/lib/maps/mutations';
import { recordMeasurements } from '@/lib/maps/record-measurements';
import { CORRECTIONS, type Measurement } from '@/lib/maps/types';
import type { WaferOnRecord } from '@/lib/maps/wafer-on-record';
import { waferStudy } from '@/lib/maps/wafer-study';
import { createSitePlan, createStream, reviseTarget } from '@/lib/streams/mutations';
import type { Target } from '@/lib/physics/target';
import { polarSites } from '@/lib/wafer/polar-sites';
import { type FreshDatabase, freshDatabase } from '../support/fresh-database';
import { soundWafer } from '../support/sound-wafer';

const actor = programActor();
const start = Date.parse('2031-04-05T00:00:00Z');
const sites = polarSites(3, 90);
const target: Target = {
  quantity: 'resistivity',
  dopant: 'boron',
  densityPerCm3: 1.35e15,
  tolerancePercent: null,
  alongCrystal: false,
  profile: 'uniform',
  lengthUm: null,
  backgroundDopant: null,
  backgroundDensityPerCm3: null,
  calibrationFactor: null,
  calibrationPercent: null,
};

let database: FreshDatabase;
let streamId = '';

/** Runs of two wafers, the second processed before the first: names do not follow the order of processing. */
function measurement(nth: number): Measurement {
  const run = Math.floor(nth / 2);
  const at = new Date(start + (run * 10 + (nth % 2 === 0 ? 5 : 1)) * 60_000);
  const levels = soundWafer(sites, 10 + Math.sin(nth * nth) / 50);
  return {
    streamId,
    readings: levels,
    facts: {
      lot: null,
      run: `R${String(run).padStart(3, '0')}`,
      wafer: nth % 2 === 0 ? 'A' : 'B',
      slot: null,
      measuredAt: at,
      processedAt: at,
      stage: null,
      tool: null,
      chamber: null,
      recipe: null,
      gauge: 'Gauge 1',
      operator: null,
      temperatureC: null,
      thicknessUm: null,
      ingotFraction: null,
      correctionsApplied: [...CORRECTIONS],
      note: null,
    },
  };
}

function valueOf(result: { ok: true; value: string } | { ok: false; reason: string }): string {
  if (!result.ok) throw new Error(result.reason);
  return result.value;
}

async function waferOf(run: string, wafer: string): Promise<WaferOnRecord> {
  const { rows } = await getPool().query<{ id: string }>(
    'SELECT id FROM wafer_measurement WHERE run = $1 AND wafer = $2',
    [run, wafer],
  );
  const found = await findWafer(actor, rows[0]?.id ?? '');
  if (found === null) throw new Error(`there is no wafer ${wafer} of ${run}`);
  return found;
}

beforeAll(async () => {
  database = await freshDatabase();
  const plan = { name: 'disc', diameterMm: 200, edgeExclusionMm: 5, orientation: 'notch' as const, sites };
  const settings = {
    slug: 'a-stream',
    name: 'A stream',
    kind: 'substrate',
    step: 'Incoming',
    tool: 'Gauge bay',
    chamber: '',
    recipe: 'R',
    quantity: 'resistivity',
    subgroup: 'run',
    subgroupSize: 2,
    controlStatistic: 'areaMean',
    chartedValue: 'statistic',
    screening: 'outliers',
    repeatabilityPercent: 0.2,
    sitePlanId: valueOf(await createSitePlan(actor, plan)),
  } as const;
  streamId = valueOf(await createStream(actor, settings, target, null));
  const [id = ''] = await takeIds(getPool(), 'intake_batch', 1);
  const batch = { id, source: 'test', origin: 'command', history: false, actor: actor.name } as const;
  await recordMeasurements(
    actor,
    batch,
    Array.from({ length: 60 }, (_, nth) => measurement(nth)),
  );
});

afterAll(() => database.drop());

describe('the page of a wafer', () => {
  it('goes along the stream in the order of processing, through runs and past their ends', async () => {
    const first = await waferOf('R000', 'B');
    expect(first.previous).toBeNull();
    expect(first.next?.wafer).toBe('A');
    const second = await waferOf('R000', 'A');
    expect(second.previous?.id).toBe(first.wafer.id);
    expect(second.next).toMatchObject({ wafer: 'B', runOrLot: 'R001' });
    expect(second.siblings.map(({ wafer }) => wafer)).toEqual(['B', 'A']);
    expect((await waferOf('R029', 'A')).next).toBeNull();
  });

  it('takes what is usual from the baseline of its limits, without itself; before there are limits, from earlier wafers', async () => {
    const late = await waferOf('R028', 'A');
    expect(late.usual.from).toBe('baseline');
    expect(late.usual.wafers).toHaveLength(50);
    expect((await waferOf('R000', 'B')).usual.wafers).toHaveLength(0);
    const study = waferStudy(late);
    expect(study.usual?.wafers).toBe(50);
    expect(study.habits.every(({ isUnusual }) => isUnusual === false)).toBe(true);
  });

  it('finds nothing by what is no id', async () => {
    for (const id of ['', '0', 'abc', '-1', '1e3', '999999999999999999', '9'.repeat(40)]) {
      expect(await findWafer(actor, id)).toBeNull();
    }
  });

  it('keeps to the target it was judged by when another is set for later wafers', async () => {
    const before = waferStudy(await waferOf('R010', 'A')).against?.expected.value;
    const other = { ...target, densityPerCm3: 2e15 };
    const revised = await reviseTarget(actor, streamId, other, {
      effectiveFrom: new Date(Date.UTC(2040, 0, 1)),
      reason: 'another product',
    });
    expect(revised).toEqual({ ok: true, value: 2 });
    expect(waferStudy(await waferOf('R010', 'A')).against?.expected.value).toBe(before);
    expect(before).toBeGreaterThan(9);
  });

  it('shows a reading taken out by hand crossed, with who and why, and the same figures after it is put back', async () => {
    const found = await waferOf('R020', 'A');
    const figures = waferStudy(found).measure.figures;
    const decide = (action: 'in' | 'out', reason: string) =>
      decideReading(actor, streamId, found.wafer.id, { siteIndex: 7, action, reason });
    expect(await decide('out', 'the probe slipped')).toEqual({ ok: true });
    const out = await waferOf('R020', 'A');
    const study = waferStudy(out);
    expect(study.status[7]).toBe('by-hand');
    expect(study.measure.goodSites).toBe(sites.length - 1);
    expect(study.measure.figures.areaMean).not.toBe(figures.areaMean);
    expect(out.decisions).toMatchObject([
      { siteIndex: 7, action: 'out', actor: actor.name, reason: 'the probe slipped' },
    ]);
    const { rows } = await getPool().query('SELECT area_mean, mean FROM wafer_measurement WHERE id = $1', [
      found.wafer.id,
    ]);
    expect(study.measure.figures).toMatchObject({ areaMean: rows[0].area_mean, mean: rows[0].mean });
    expect(await decide('in', 'it was sound')).toEqual({ ok: true });
    const back = await waferOf('R020', 'A');
    expect(waferStudy(back).measure.figures).toEqual(figures);
    expect(back.decisions).toHaveLength(2);
    expect(back.wafer.readings).toEqual(found.wafer.readings);
  });
});
