import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { getPool } from '@/lib/database/client';
import { findStreamStanding, listBoardStreams } from '@/lib/excursions/data';
import { listLimitsInForce } from '@/lib/limits/data';
import { approveLimits, changeScreening, draftLimits } from '@/lib/limits/mutations';
import { freshDatabase, type FreshDatabase } from '../support/fresh-database';
import {
  actor,
  hour,
  judgementOf,
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

const approval = (effectiveFrom: Date) => ({ reason: 'looked at', effectiveFrom });

const revisionId = async (streamId: string, revision: number) =>
  (
    await getPool().query<{ id: string }>(
      'SELECT id FROM limit_revision WHERE stream_id = $1 AND revision = $2',
      [streamId, revision],
    )
  ).rows[0]?.id ?? '';

/** A stream with 30 quiet wafers, of which the first 25 gave its first limits, and a draft from the first ten. */
async function draftedStream(): Promise<string> {
  const { id } = await newStream();
  await recordInTurn(Array.from({ length: 30 }, (_, i) => wafer(id, i)));
  await draftLimits(actor, id, { from: hour(0), to: hour(9) }, 'a calm span');
  return id;
}

describe('a provisional revision', () => {
  const judgedBy = async (id: string) => (await judgementOf(id)).points.map(({ revision }) => revision);
  const times = (count: number, revision: number | null) => Array.from({ length: count }, () => revision);

  it('judges nothing from the instant on at which another takes force, though its own lies later', async () => {
    const id = await draftedStream();
    await approveLimits(actor, await revisionId(id, 2), approval(hour(9)));
    expect(await judgedBy(id)).toEqual([...times(10, null), ...times(20, 2)]);
    await record([wafer(id, 30)]);
    await record([{ ...wafer(id, 200), facts: { ...wafer(id, 200).facts, processedAt: hour(20.5) } }]);
    expect(await judgedBy(id)).toEqual([...times(10, null), ...times(22, 2)]);
    const now = new Date();
    expect((await findStreamStanding(actor, id, now)).inForce?.revision).toBe(2);
    expect((await listLimitsInForce(actor)).find((one) => one.streamId === id)?.revision).toBe(2);
    const board = (await listBoardStreams(actor)).find((one) => one.id === id);
    expect(board?.limits.at(-1)?.state).toBe('approved');
    expect(await approveLimits(actor, await revisionId(id, 1), approval(hour(9)))).toEqual({
      ok: false,
      reason: 'Another revision was approved since: revision 1 gave way to it.',
    });
  });

  it('keeps what it judged before the other takes force', async () => {
    const id = await draftedStream();
    await approveLimits(actor, await revisionId(id, 2), approval(hour(27)));
    expect(await judgedBy(id)).toEqual([...times(25, null), ...times(3, 1), ...times(2, 2)]);
  });

  it('of a history gives way to limits inherited from before it', async () => {
    const { id } = await newStream();
    await record(
      Array.from({ length: 30 }, (_, i) => wafer(id, i)),
      true,
    );
    await settleLimits(id);
    expect(await judgedBy(id)).toEqual(times(30, 2));
    await record([wafer(id, 30)]);
    expect((await judgedBy(id)).at(-1)).toBe(2);
  });

  it('begun by a change of the screening judges, whatever is approved for the time before', async () => {
    const id = await draftedStream();
    await approveLimits(actor, await revisionId(id, 2), approval(hour(9)));
    await changeScreening(actor, id, 'impossible', 'few sites');
    const later = new Date(Date.now() + 60_000);
    const inForce = async () => (await findStreamStanding(actor, id, later)).inForce;
    expect(await inForce()).toMatchObject({ revision: 3, state: 'provisional' });
    await draftLimits(actor, id, { from: hour(0), to: hour(19) }, 'for the time before that');
    await approveLimits(actor, await revisionId(id, 4), approval(hour(19)));
    expect(await judgedBy(id)).toEqual([...times(10, null), ...times(10, 2), ...times(10, 4)]);
    expect(await inForce()).toMatchObject({ revision: 3, state: 'provisional' });
  });
});
