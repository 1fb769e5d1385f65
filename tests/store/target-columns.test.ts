import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { listBoardStreams } from '@/lib/excursions/data';
import type { Target } from '@/lib/physics/target';
import { findStreamSettings } from '@/lib/streams/data';
import { reviseTarget } from '@/lib/streams/mutations';
import { freshDatabase, type FreshDatabase } from '../support/fresh-database';
import { actor, newStream, record, wafer } from '../support/store-line';
import { BORON, DRIVEN, EPI, GAUSSIAN, PAIRS } from '../unit/physics/targets';

let database: FreshDatabase;

beforeAll(async () => {
  database = await freshDatabase();
});

afterAll(() => database.drop());

/** The targets of a stream as they come back, in the order in which they were recorded. */
async function broughtBack(targets: readonly Target[]): Promise<Target[]> {
  const { id, slug } = await newStream({ quantity: targets[0]?.quantity ?? 'resistivity' });
  for (const [i, target] of targets.entries()) {
    const made = await reviseTarget(actor, id, target, { effectiveFrom: new Date(i), reason: 'as given' });
    if (!made.ok) throw new Error(made.reason);
  }
  return (await findStreamSettings(actor, slug))?.targets.map(({ target }) => target) ?? [];
}

describe('a target of any kind', () => {
  it('comes back to the last digit, with nothing that was not said', async () => {
    const layers = [GAUSSIAN, DRIVEN, PAIRS, EPI, { ...EPI, method: 'other' as const }];
    expect(await broughtBack(layers)).toStrictEqual(layers);
    const uniform: Target[] = [
      BORON,
      { ...BORON, counterDopant: 'phosphorus', counterDensityPerCm3: 1 / 3e-15 },
      { ...BORON, temperatureCoefficientPercentPerC: -0.012 },
    ];
    expect(await broughtBack(uniform)).toStrictEqual(uniform);
  });

  it.each([DRIVEN, PAIRS, EPI])('is on the board what it is on its own page: $profile', async (target) => {
    const { id, slug } = await newStream({ quantity: target.quantity });
    await reviseTarget(actor, id, target, { effectiveFrom: new Date(0), reason: 'as given' });
    await record([wafer(id, 0)]);
    const board = (await listBoardStreams(actor)).find((stream) => stream.slug === slug);
    expect(board?.target?.target).toStrictEqual(target);
  });

  it('is refused by the database itself where one of two that belong together is missing', async () => {
    await expect(broughtBack([{ ...DRIVEN, driveInMin: null }])).rejects.toThrow(/target_revision_drive_in/);
    await expect(broughtBack([{ ...PAIRS, pairs: null }])).rejects.toThrow(/target_revision_pairs/);
    const half: Target = { ...BORON, counterDopant: 'phosphorus' };
    await expect(broughtBack([half])).rejects.toThrow(/target_revision_counter/);
  });
});
