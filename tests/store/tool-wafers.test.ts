import { afterAll, beforeAll, expect, it } from 'vitest';
import { listToolWafers } from '@/lib/excursions/data';
import { listToolSettings } from '@/lib/streams/data';
import { retireStream, reviseTarget } from '@/lib/streams/mutations';
import { freshDatabase, type FreshDatabase } from '../support/fresh-database';
import { actor, hour, newStream, record, wafer } from '../support/store-line';
import { BORON } from '../unit/physics/targets';

let database: FreshDatabase;

beforeAll(async () => {
  database = await freshDatabase();
});

afterAll(() => database.drop());

it('the wafers of a tool come in the order of processing, each over what its own target expected', async () => {
  const place = { tool: 'Implanter 9', chamber: 'A' };
  const [first, second] = [await newStream(place), await newStream(place)];
  const other = await newStream({ ...place, chamber: 'B' });
  const retired = await newStream(place);
  await retireStream(actor, retired.id, true);
  for (const [{ id }, densityPerCm3] of [
    [first, 1e15],
    [second, 1.4e15],
  ] as const) {
    const meta = { effectiveFrom: new Date(0), reason: 'as given' };
    await reviseTarget(actor, id, { ...BORON, densityPerCm3 }, meta);
  }
  await record([
    wafer(first.id, 0, 13.306),
    wafer(second.id, 1, 10),
    wafer(other.id, 2),
    wafer(first.id, 3, 12),
  ]);
  const settings = await listToolSettings(actor, place);
  expect(settings.map(({ stream }) => stream.id)).toEqual([first.id, second.id]);
  const wafers = await listToolWafers(
    actor,
    settings.map(({ stream }) => stream.id),
  );
  expect(wafers.map(({ streamId, at }) => [streamId, at])).toEqual([
    [first.id, hour(0).getTime()],
    [second.id, hour(1).getTime()],
    [first.id, hour(3).getTime()],
  ]);
  // Boron 1e15 is 13.306 Ω·cm (ASTM F723): the first reads as expected.
  expect(wafers[0]?.ratio).toBeCloseTo(1, 4);
  expect(wafers[2]?.ratio).toBeCloseTo(12 / 13.306, 4);
});
