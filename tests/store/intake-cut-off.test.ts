import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { getPool } from '@/lib/database/client';
import { intakeFile } from '@/lib/maps/intake-file';
import { createSitePlan } from '@/lib/streams/mutations';
import { polarSites } from '@/lib/wafer/polar-sites';
import { freshDatabase, type FreshDatabase } from '../support/fresh-database';
import { take } from '../support/store-file';
import { actor, fileText, hour, newStream, rowCounts, wafer } from '../support/store-line';

let database: FreshDatabase;
let stream: { id: string; slug: string };

beforeAll(async () => {
  database = await freshDatabase();
  stream = await newStream();
});

afterAll(() => database.drop());

describe('taking a file that is cut off', () => {
  it('while it is checked records nothing', async () => {
    const text = fileText(
      stream.slug,
      [0, 1, 2, 3].map((i) => wafer(stream.id, i)),
    );
    const counts = await rowCounts();
    const broken = {
      name: 'broken.csv',
      open: () =>
        (async function* () {
          yield new TextEncoder().encode(text.slice(0, 1500));
          throw new Error('the disk is gone');
        })(),
    };
    const options = { origin: 'command', history: false, sound: true, defaults: {} } as const;
    await expect(intakeFile(actor, broken, options)).rejects.toThrow('the disk is gone');
    expect(await rowCounts()).toEqual(counts);
  });

  it('while it is recorded can be taken again, and ends with every wafer once', async () => {
    // 400 wafers of 289 readings are more than one transaction takes.
    const sites = polarSites(8, 90);
    const plan = { name: 'many', diameterMm: 200, edgeExclusionMm: 0, orientation: 'notch' as const, sites };
    const made = await createSitePlan(actor, plan);
    const large = await newStream({ sitePlanId: made.ok ? made.value : '', screening: 'impossible' });
    const wafers = Array.from({ length: 400 }, (_, i) =>
      sites.map(
        ({ xMm, yMm }) => `${large.slug},W${i},${hour(i).toISOString()},${xMm},${yMm},${10 + (i % 7) / 10}`,
      ),
    );
    const text = ['stream,wafer,measured_at,x_mm,y_mm,resistivity_ohm_cm', ...wafers.flat(), ''].join('\n');
    const stop = () => {
      throw new Error('stopped');
    };
    await expect(take(text, { onProgress: stop }, 1 << 17)).rejects.toThrow('stopped');
    const count = async () =>
      (
        await getPool().query('SELECT count(*)::integer AS n FROM wafer_measurement WHERE stream_id = $1', [
          large.id,
        ])
      ).rows[0]?.n as number;
    const first = await count();
    expect(first).toBeGreaterThan(100);
    expect(first).toBeLessThan(400);
    const { rows } = await getPool().query(
      'SELECT recorded, finished_at FROM intake_batch ORDER BY id DESC LIMIT 1',
    );
    expect(rows[0]).toEqual({ recorded: first, finished_at: null });
    expect(await take(text, {}, 1 << 17)).toMatchObject({
      recorded: 400 - first,
      repeated: first,
      refused: 0,
    });
    expect(await count()).toBe(400);
  });
});
