import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { getPool } from '@/lib/database/client';
import { changeScreening } from '@/lib/limits/mutations';
import { decideReading } from '@/lib/maps/mutations';
import type { Target } from '@/lib/physics/target';
import { listStreamEvents, findStreamSettings } from '@/lib/streams/data';
import { createSitePlan, reviseSpecification, reviseTarget } from '@/lib/streams/mutations';
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

const boron: Target = {
  quantity: 'resistivity',
  dopant: 'boron',
  densityPerCm3: 1.3e15,
  tolerancePercent: null,
  alongCrystal: false,
  profile: 'uniform',
  lengthUm: null,
  backgroundDopant: null,
  backgroundDensityPerCm3: null,
  calibrationFactor: null,
  calibrationPercent: null,
};

const NO_SPECIFICATION = {
  meanLower: null,
  meanUpper: null,
  siteLower: null,
  siteUpper: null,
  nonuniformityMetric: null,
  nonuniformityUpper: null,
};

const measuredBy = async (streamId: string) =>
  (
    await getPool().query<{ wafer: string; screening: string; revision: number | null; level: number }>(
      `SELECT w.wafer, w.screening, w.level, t.revision FROM wafer_measurement w
       LEFT JOIN target_revision t ON t.id = w.target_revision_id WHERE w.stream_id = $1 ORDER BY w.processed_at`,
      [streamId],
    )
  ).rows;

const REFUSED = { ok: false, reason: expect.stringMatching(/on record.*choose a time after them/) };

/** A stream charted against expected, about 0 %, with limits that were in use before. */
async function relativeStream(): Promise<string> {
  const { id } = await newStream({ chartedValue: 'relative' });
  await reviseTarget(actor, id, boron, { effectiveFrom: new Date(0), reason: 'first' });
  return id;
}

describe('a name that two people take at the same time', () => {
  it('for a stream is given to one; the other is told', async () => {
    const made = await Promise.allSettled([1, 2, 3].map(() => newStream({ slug: 'taken' })));
    expect(made.filter(({ status }) => status === 'fulfilled')).toHaveLength(1);
    expect(made.flatMap((one) => (one.status === 'rejected' ? [String(one.reason)] : []))).toEqual(
      Array.from({ length: 2 }, () => 'Error: There is a stream "taken" already.'),
    );
  });

  it('for a site plan is given to one; the other is told', async () => {
    const plan = {
      name: 'taken',
      diameterMm: 200,
      edgeExclusionMm: 0,
      orientation: 'notch',
      sites: [],
    } as const;
    const made = await Promise.all(
      [1, 2, 3].map(() => createSitePlan(actor, { ...plan, sites: [{ xMm: 0, yMm: 0 }] })),
    );
    expect(made.filter(({ ok }) => ok)).toHaveLength(1);
    expect(made.filter(({ ok }) => !ok)).toEqual(
      Array.from({ length: 2 }, () => ({ ok: false, reason: 'There is a site plan "taken" already.' })),
    );
  });
});

describe('a revision of target or specification', () => {
  it('takes force after the wafers on record, so that they stay as they were judged', async () => {
    const id = await relativeStream();
    await recordInTurn([wafer(id, 0), wafer(id, 2)]);
    const next = { ...boron, densityPerCm3: 1.4e15 };
    const specification = { ...NO_SPECIFICATION, meanUpper: 9 };
    for (const at of [0, 1, 2]) {
      const meta = { effectiveFrom: hour(at), reason: 'new' };
      expect(await reviseTarget(actor, id, next, meta)).toEqual(REFUSED);
      expect(await reviseSpecification(actor, id, specification, meta)).toEqual(REFUSED);
    }
    const meta = { effectiveFrom: hour(2.5), reason: 'new' };
    expect(await reviseTarget(actor, id, next, meta)).toEqual({ ok: true, value: 2 });
    expect(await reviseSpecification(actor, id, specification, meta)).toEqual({ ok: true, value: 1 });
  });

  it('measures each wafer by when it was processed, whenever it is recorded or measured again', async () => {
    const id = await relativeStream();
    await record([wafer(id, 0), wafer(id, 2)]);
    await reviseTarget(
      actor,
      id,
      { ...boron, densityPerCm3: 1.4e15 },
      { effectiveFrom: hour(2.5), reason: 'new' },
    );
    await record([wafer(id, 3)]);
    await record([wafer(id, 1)]);
    expect((await measuredBy(id)).map(({ revision }) => revision)).toEqual([1, 1, 1, 2]);
    const { rows } = await getPool().query<{ id: string; level: number }>(
      'SELECT id, level FROM wafer_measurement WHERE stream_id = $1 ORDER BY processed_at LIMIT 1',
      [id],
    );
    for (const action of ['out', 'in'] as const)
      await decideReading(actor, id, rows[0]!.id, { siteIndex: 3, action, reason: 'a look' });
    expect((await measuredBy(id))[0]).toMatchObject({ revision: 1, level: rows[0]!.level });
  });

  it('with a restart parts the rules where it takes force, in one transaction with it', async () => {
    const id = await relativeStream();
    await recordInTurn(Array.from({ length: 30 }, (_, i) => wafer(id, i)));
    const next = { ...boron, calibrationFactor: 1.004, calibrationPercent: 0.1 };
    const from = hour(29.5);
    await reviseTarget(actor, id, next, {
      effectiveFrom: from,
      reason: 'the gauge was compared',
      restart: true,
    });
    expect(await listStreamEvents(actor, id)).toMatchObject([
      { kind: 'adjustment', at: from, restart: true, text: 'target revision 2: the gauge was compared' },
    ]);
    await recordInTurn(Array.from({ length: 2 }, (_, i) => wafer(id, 30 + i)));
    const { points } = await judgementOf(id);
    expect(points[30]?.moving_range).toBeNull();
    expect(points[31]?.moving_range).not.toBeNull();
  });

  it('without a restart moves what a tool that does not follow reads, and the rules see it', async () => {
    const id = await relativeStream();
    await recordInTurn(Array.from({ length: 30 }, (_, i) => wafer(id, i)));
    const before = await rulesOf(id);
    await reviseTarget(
      actor,
      id,
      { ...boron, calibrationFactor: 1.1 },
      { effectiveFrom: hour(29.5), reason: 'x' },
    );
    await record([wafer(id, 30)]);
    expect(await rulesOf(id)).toEqual(
      [...before, 'level:beyond-3-sigma', 'moving-range:beyond-limit'].sort(),
    );
    expect(await listStreamEvents(actor, id)).toEqual([]);
  });
});

describe('a change of the screening', () => {
  it('goes by when a wafer was processed, as the limits that judge it do', async () => {
    const { id, slug } = await newStream();
    await recordInTurn(Array.from({ length: 30 }, (_, i) => wafer(id, i)));
    expect(await changeScreening(actor, id, 'impossible', 'few sites')).toEqual({ ok: true });
    const { rows } = await getPool().query<{ at: Date }>(
      'SELECT effective_from AS at FROM limit_revision WHERE stream_id = $1 AND revision = 2',
      [id],
    );
    const at = rows[0]!.at.getTime();
    const processed = (i: number, instant: number) => {
      const one = wafer(id, i);
      return { ...one, facts: { ...one.facts, processedAt: new Date(instant) } };
    };
    await recordInTurn([processed(40, at + 1), processed(41, at), processed(42, at - 1)]);
    expect((await measuredBy(id)).slice(-3).map(({ screening }) => screening)).toEqual([
      'outliers',
      'outliers',
      'impossible',
    ]);
    expect((await judgementOf(id)).points.slice(-3).map(({ revision }) => revision)).toEqual([1, 1, 2]);
    expect((await findStreamSettings(actor, slug))?.screenings).toMatchObject([
      {
        at: new Date(at),
        former: 'outliers',
        screening: 'impossible',
        author: actor.name,
        reason: 'few sites',
      },
    ]);
  });

  it('never reaches back over wafers on record, where a clock ran ahead', async () => {
    const { id } = await newStream();
    const ahead = new Date(Date.now() + 240_000);
    await record([{ ...wafer(id, 0), facts: { ...wafer(id, 0).facts, processedAt: ahead } }]);
    await settleLimits(id);
    await record([wafer(id, 1)]);
    expect(await changeScreening(actor, id, 'off', 'to see everything')).toEqual({ ok: true });
    const { rows } = await getPool().query('SELECT at FROM screening_change WHERE stream_id = $1', [id]);
    expect(rows).toEqual([{ at: ahead }]);
  });
});
