import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { provenActor, type Actor } from '@/lib/access/actor';
import { getPool } from '@/lib/database/client';
import { stepExcursion, type ExcursionStep } from '@/lib/excursions/mutations';
import {
  approveLimits,
  changeScreening,
  discardLimits,
  draftLimits,
  enterInheritedLimits,
} from '@/lib/limits/mutations';
import { listLimitRevisions } from '@/lib/limits/data';
import { decideReading, recordMeasurements } from '@/lib/maps/mutations';
import { findStreamSettings } from '@/lib/streams/data';
import { recordStreamEvent, retireStream, reviseSpecification } from '@/lib/streams/mutations';
import { freshDatabase, type FreshDatabase } from '../support/fresh-database';
import {
  actor,
  casesOf,
  hour,
  newBatch,
  newStream,
  recordInTurn,
  settleLimits,
  wafer,
} from '../support/store-line';

const REFUSED = { ok: false, reason: expect.stringContaining('Your roles do not allow this') };
const NOTHING = {
  meanLower: null,
  meanUpper: null,
  siteLower: null,
  siteUpper: null,
  nonuniformityMetric: null,
  nonuniformityUpper: null,
};

let database: FreshDatabase;
let theirs: { id: string; slug: string };
let own: { id: string; slug: string };
/** A process owner of one stream, who knows the ids of another. */
let owner: Actor;
let excursionId = '';
let waferId = '';
let draftId = '';

beforeAll(async () => {
  database = await freshDatabase();
  [theirs, own] = [await newStream(), await newStream()];
  await settleLimits(theirs.id);
  await recordInTurn([0, 1, 2, 3].map((i) => wafer(theirs.id, i)).concat(wafer(theirs.id, 4, 12)));
  await draftLimits(actor, theirs.id, { from: hour(0), to: hour(3) }, 'theirs');
  excursionId = (await casesOf(theirs.id))[0]?.id ?? '';
  draftId = (await listLimitRevisions(actor, theirs.id))[0]?.id ?? '';
  const { rows } = await getPool().query<{ id: string }>('SELECT min(id) AS id FROM wafer_measurement');
  waferId = rows[0]?.id ?? '';
  owner = provenActor({
    kind: 'person',
    id: 'owner',
    name: 'an owner elsewhere',
    grants: [{ role: 'process-owner', streamIds: [own.id] }],
  });
});
afterAll(() => database.drop());

/** All that may change on a stream when somebody acts on it. */
async function stateOf(streamId: string) {
  const { rows } = await getPool().query(
    `SELECT to_jsonb(s) AS stream,
       (SELECT jsonb_agg(to_jsonb(l) ORDER BY l.id) FROM limit_revision l WHERE l.stream_id = s.id) AS limits,
       (SELECT jsonb_agg(to_jsonb(e) ORDER BY e.id) FROM excursion e WHERE e.stream_id = s.id) AS cases,
       (SELECT count(*) FROM excursion_entry e WHERE e.stream_id = s.id) AS entries,
       (SELECT count(*) FROM wafer_measurement w WHERE w.stream_id = s.id) AS wafers,
       (SELECT count(*) FROM reading_exclusion x WHERE x.stream_id = s.id) AS exclusions,
       (SELECT count(*) FROM stream_event v WHERE v.stream_id = s.id) AS events,
       (SELECT count(*) FROM specification_revision r WHERE r.stream_id = s.id) AS specifications
     FROM stream s WHERE s.id = $1`,
    [streamId],
  );
  return rows[0] as unknown;
}

describe('someone with a role for other streams, who has the id', () => {
  it('changes nothing of a stream’s cases, limits, settings, events and readings', async () => {
    const before = await stateOf(theirs.id);
    const steps: ExcursionStep[] = [
      { to: 'acknowledged', note: '' },
      { to: 'under-investigation', note: '' },
      { to: 'noted', note: 'hello' },
      { to: 'closed', note: '', cause: 'none' },
    ];
    for (const step of steps) expect(await stepExcursion(owner, excursionId, step)).toEqual(REFUSED);
    const span = { from: hour(0), to: hour(3) };
    const limits = (await listLimitRevisions(actor, theirs.id))[0]!.limits;
    const approval = { reason: 'mine', effectiveFrom: hour(9) };
    expect(await draftLimits(owner, theirs.id, span, 'mine')).toEqual(REFUSED);
    expect(await enterInheritedLimits(owner, theirs.id, limits, hour(9), 'mine')).toEqual(REFUSED);
    expect(await approveLimits(owner, draftId, approval)).toEqual(REFUSED);
    expect(await discardLimits(owner, draftId)).toEqual(REFUSED);
    expect(await changeScreening(owner, theirs.id, 'off', 'mine')).toEqual(REFUSED);
    expect(await retireStream(owner, theirs.id, true)).toEqual(REFUSED);
    const event = { kind: 'adjustment', at: hour(2), restart: true, text: 'mine' } as const;
    expect(await recordStreamEvent(owner, theirs.id, event)).toEqual(REFUSED);
    const meta = { effectiveFrom: hour(9), reason: 'mine' };
    expect(await reviseSpecification(owner, theirs.id, { ...NOTHING, meanUpper: 9 }, meta)).toEqual(REFUSED);
    const decision = { siteIndex: 0, action: 'out', reason: 'mine' } as const;
    expect(await decideReading(owner, theirs.id, waferId, decision)).toEqual(REFUSED);
    expect(await stateOf(theirs.id)).toEqual(before);
  });

  it('reaches no wafer of another stream by naming a stream of their own', async () => {
    const decision = { siteIndex: 0, action: 'out', reason: 'mine' } as const;
    expect(await decideReading(owner, own.id, waferId, decision)).toEqual({
      ok: false,
      reason: 'There is no such wafer.',
    });
  });

  it('records no wafer of another stream, and none at all together with one', async () => {
    const batch = await newBatch();
    const before = await stateOf(own.id);
    const both = [wafer(own.id, 0), wafer(theirs.id, 60)];
    await expect(recordMeasurements(owner, batch, both)).rejects.toThrow('Your roles do not allow this');
    expect(await stateOf(own.id)).toEqual(before);
    expect(await recordMeasurements(owner, batch, [wafer(own.id, 0)])).toMatchObject([{ kind: 'recorded' }]);
  });

  it('sees the line all the same: roles part what is done, not what is seen', async () => {
    expect((await findStreamSettings(owner, theirs.slug))?.stream.id).toBe(theirs.id);
  });
});
