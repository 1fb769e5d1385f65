import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { provenActor } from '@/lib/access/actor';
import { audited } from '@/lib/access/audited';
import { appending } from '@/lib/access/audit-chain';
import { verifyAudit } from '@/lib/access/verify-audit';
import { getPool } from '@/lib/database/client';
import { inTransaction } from '@/lib/database/transaction';
import { stepExcursion } from '@/lib/excursions/mutations';
import { approveLimits, changeScreening, discardLimits, draftLimits } from '@/lib/limits/mutations';
import { decideReading } from '@/lib/maps/mutations';
import type { Target } from '@/lib/physics/target';
import { recordStreamEvent, retireStream, reviseSpecification, reviseTarget } from '@/lib/streams/mutations';
import { freshDatabase, type FreshDatabase } from '../support/fresh-database';
import { take } from '../support/store-file';
import {
  actor,
  casesOf,
  fileText,
  hour,
  newStream,
  record,
  recordInTurn,
  settleLimits,
  wafer,
} from '../support/store-line';

let database: FreshDatabase;
beforeAll(async () => {
  database = await freshDatabase();
});
afterAll(() => database.drop());

const SPECIFICATION = {
  meanLower: 9,
  meanUpper: 11,
  siteLower: null,
  siteUpper: null,
  nonuniformityMetric: null,
  nonuniformityUpper: null,
};
const TARGET: Target = {
  quantity: 'resistivity',
  dopant: 'boron',
  densityPerCm3: 1.34e15,
  tolerancePercent: null,
  alongCrystal: false,
  profile: 'uniform',
  lengthUm: null,
  backgroundDopant: null,
  backgroundDensityPerCm3: null,
  calibrationFactor: null,
  calibrationPercent: null,
};
const LATER = new Date('2031-01-01T00:00:00Z');

async function lastTold(count: number) {
  const { rows } = await getPool().query(
    `SELECT action, subject_kind AS kind, stream_id AS stream, before, after, why, actor_name AS who
     FROM audit_entry ORDER BY id DESC LIMIT $1`,
    [count],
  );
  return rows.reverse();
}

const draftOf = async (streamId: string) =>
  (
    await getPool().query<{ id: string }>(
      `SELECT id FROM limit_revision WHERE stream_id = $1 AND state = 'draft'`,
      [streamId],
    )
  ).rows[0]?.id ?? '';

describe('the audit trail tells', () => {
  test('of what is changed on a stream', async () => {
    const { id, slug } = await newStream();
    const [plan, stream] = await lastTold(2);
    expect(plan).toMatchObject({ action: 'created a site plan', after: { name: 'nine', sites: 9 } });
    expect(stream).toMatchObject({ action: 'created a stream', stream: id, after: { name: slug } });
    await reviseSpecification(actor, id, SPECIFICATION, { effectiveFrom: hour(0), reason: 'customer' });
    await reviseSpecification(
      actor,
      id,
      { ...SPECIFICATION, meanUpper: 12 },
      { effectiveFrom: hour(1), reason: 'wider' },
    );
    await reviseTarget(actor, id, TARGET, { effectiveFrom: hour(0), reason: 'new product' });
    await recordStreamEvent(actor, id, { kind: 'maintenance', at: hour(1), restart: true, text: 'new pins' });
    await changeScreening(actor, id, 'impossible', 'all sites count');
    await retireStream(actor, id, true);
    await retireStream(actor, id, false);
    expect(await lastTold(7)).toMatchObject([
      {
        action: 'revised a specification',
        before: null,
        after: { revision: 1, meanUpper: 11 },
        why: 'customer',
      },
      { before: { revision: 1, meanUpper: 11 }, after: { revision: 2, meanUpper: 12 }, why: 'wider' },
      { action: 'revised a target', before: null, after: { densityPerCm3: 1.34e15 }, why: 'new product' },
      { action: 'recorded an event', kind: 'event', after: { restart: true }, why: 'new pins' },
      {
        action: 'changed the screening',
        before: { screening: 'outliers' },
        after: { screening: 'impossible' },
      },
      { action: 'retired a stream', stream: id, who: actor.name },
      { action: 'took a stream up again' },
    ]);
  });

  test('of all that a target says, and of nothing that it leaves open', async () => {
    const { id } = await newStream();
    const implant = {
      quantity: 'sheet_resistance',
      profile: 'implant',
      rangeUm: 0.3,
      backgroundDopant: 'phosphorus',
    } as const;
    const target = {
      ...TARGET,
      ...implant,
      lengthUm: 0.07,
      backgroundDensityPerCm3: 1e15,
      densityPerCm3: 1e18,
    };
    await reviseTarget(actor, id, target, { effectiveFrom: hour(0), reason: 'monitors' });
    await reviseTarget(actor, id, { ...target, rangeUm: 0.4 }, { effectiveFrom: hour(1), reason: 'deeper' });
    const [told] = await lastTold(1);
    expect(told.before).toMatchObject({ profile: 'implant', rangeUm: 0.3, lengthUm: 0.07 });
    expect(told.after).toMatchObject({ profile: 'implant', rangeUm: 0.4, backgroundDopant: 'phosphorus' });
    expect(told.before).not.toHaveProperty('tolerancePercent');
    expect(told.after).not.toHaveProperty('tolerancePercent');
  });

  test('of limits', async () => {
    const { id } = await newStream();
    await recordInTurn([1, 2, 3].map((i) => wafer(id, i)));
    const span = { from: hour(0), to: hour(9) };
    await draftLimits(actor, id, span, 'first try');
    await discardLimits(actor, await draftOf(id));
    await draftLimits(actor, id, span, 'second try');
    await approveLimits(actor, await draftOf(id), { reason: 'fits', effectiveFrom: LATER });
    expect(await lastTold(4)).toMatchObject([
      { action: 'drafted limits', stream: id, after: { revision: 1, subgroups: 3 }, why: 'first try' },
      { action: 'set limits aside', before: { state: 'draft' }, after: { revision: 1, state: 'discarded' } },
      { action: 'drafted limits', after: { revision: 2 } },
      {
        action: 'approved limits',
        before: { state: 'draft' },
        after: { revision: 2, state: 'approved', effectiveFrom: LATER.toISOString() },
        why: 'fits',
      },
    ]);
  });

  test('of cases and readings', async () => {
    const { id } = await newStream();
    await settleLimits(id);
    const [outcome] = await record([wafer(id, 1, 20)]);
    const waferId = outcome?.kind === 'recorded' ? outcome.waferId : '';
    const excursion = (await casesOf(id))[0]?.id ?? '';
    await stepExcursion(actor, excursion, { to: 'acknowledged', note: '' });
    await stepExcursion(actor, excursion, { to: 'noted', note: 'asked the shift before' });
    await stepExcursion(actor, excursion, { to: 'closed', note: '', cause: 'the probe head' });
    await decideReading(actor, id, waferId, { siteIndex: 2, action: 'out', reason: 'a scratch' });
    expect(await lastTold(4)).toMatchObject([
      {
        action: 'acknowledged a case',
        before: { state: 'open' },
        after: { state: 'acknowledged' },
        why: null,
      },
      { action: 'wrote into a case', before: null, after: null, why: 'asked the shift before' },
      { action: 'closed a case', after: { state: 'closed' }, why: 'the probe head' },
      { action: 'took out a reading', kind: 'wafer', after: { siteIndex: 2 }, why: 'a scratch' },
    ]);
  });

  test('of nothing that was refused', async () => {
    const { id } = await newStream();
    const viewer = provenActor({
      kind: 'person',
      id: 'v',
      name: 'V',
      grants: [{ role: 'viewer', streamIds: null }],
    });
    const [before] = await lastTold(1);
    expect(await retireStream(viewer, id, true)).toMatchObject({ ok: false });
    expect(await retireStream(actor, '999999', true)).toMatchObject({ ok: false });
    expect(await discardLimits(actor, '999999')).toMatchObject({ ok: false });
    expect(await lastTold(1)).toEqual([before]);
  });

  test('of each batch once, whichever way its wafers went', async () => {
    const { id, slug } = await newStream();
    await recordInTurn([1, 2, 3].map((i) => wafer(id, i)));
    await record([wafer(id, 4), wafer(id, 5)]);
    await take(fileText(slug, [wafer(id, 6)]));
    await take(fileText(slug, [wafer(id, 7), wafer(id, 8)]));
    await take(fileText(slug, [wafer(id, 8)]));
    expect(await lastTold(1)).toMatchObject([{ action: 'received maps on record' }]);
    await take('stream,wafer\nnone,W1\n');
    expect(await lastTold(1)).toMatchObject([{ action: 'refused maps', after: { source: 'monday.csv' } }]);
    expect(await untold()).toEqual([]);
    const { rows } = await getPool().query(`SELECT count(*)::integer AS n FROM intake_batch`);
    expect(rows[0].n).toBeGreaterThanOrEqual(8);
  });
});

/** Batches without exactly one entry. */
async function untold() {
  const { rows } = await getPool().query(
    `SELECT b.id, b.source, count(e.id) FROM intake_batch b
     LEFT JOIN audit_entry e ON e.subject_kind = 'batch' AND e.subject_id = b.id::text GROUP BY b.id HAVING count(e.id) <> 1`,
  );
  return rows;
}

describe('many writers at once', () => {
  const telling = { action: 'changed a setting', subject: { kind: 'setting', id: 'four-eyes' } } as const;
  const ROUNDS = 20;

  test('leave one chain without a gap, also beside another process whose entries this one does not know', async () => {
    const streams = await Promise.all(Array.from({ length: 3 }, () => newStream()));
    const { entries: before } = await verifyAudit();
    const rounds = async (write: () => Promise<unknown>) => {
      for (let i = 0; i < ROUNDS; i += 1) await write();
    };
    const here = () => rounds(() => audited(actor, async (_, tell) => tell(telling)));
    const elsewhere = () =>
      rounds(() =>
        inTransaction(async () => undefined, {
          last: async (client) => (await appending(client, [{ ...telling, actor }])).statement,
        }),
      );
    const wafers = Array.from({ length: ROUNDS }, (_, i) => i + 1);
    await Promise.all([
      ...streams.map(({ id }) => recordInTurn(wafers.map((i) => wafer(id, i)))),
      ...[here(), here(), here(), elsewhere(), elsewhere()],
    ]);
    expect(await untold()).toEqual([]);
    expect(await verifyAudit()).toMatchObject({ entries: before + 8 * ROUNDS, heads: 1, broken: [] });
  });
});
