import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { demonstrationId } from '@/lib/access/demonstration';
import { getPool } from '@/lib/database/client';
import { lineScore, type LineScore } from '@/seed/line-score';
import { seedDemo } from '@/seed/seed-demo';
import { freshDatabase, type FreshDatabase } from '../support/fresh-database';

const endAt = new Date('2031-05-17T06:00:00Z');
let database: FreshDatabase;
let wafers: number;
let score: LineScore;

beforeAll(async () => {
  database = await freshDatabase();
  wafers = await seedDemo(() => undefined, endAt);
  score = await lineScore(endAt);
}, 120_000);

afterAll(() => database.drop());

describe('the demonstration line', () => {
  it('records every wafer that was made, each with its readings and in one subgroup', async () => {
    const { rows } = await getPool().query(
      `SELECT (SELECT count(*)::integer FROM wafer_measurement) AS wafers, (SELECT count(*)::integer FROM wafer_reading) AS maps,
         (SELECT sum(cardinality(wafer_ids))::integer FROM subgroup) AS members`,
    );
    expect(rows[0]).toEqual({ wafers, maps: wafers, members: wafers });
    expect(wafers).toBeGreaterThan(2000);
  });

  it('finds each mishap by the chart that should, within the subgroups set down beforehand', () => {
    const report = score.mishaps.map(
      ({ mishap, found, rule }) =>
        `${mishap.streamSlug}, ${mishap.effect.kind}: ${found ?? 'never'} of ${mishap.expectedWithinSubgroups} subgroups (${rule})`,
    );
    console.info(`\n${report.join('\n')}`);
    for (const { mishap, found } of score.mishaps) {
      expect(found, mishap.truth).not.toBeNull();
      expect(found, mishap.truth).toBeLessThanOrEqual(mishap.expectedWithinSubgroups);
    }
  });

  it('leaves the quiet streams quiet, but for what chance brings', () => {
    console.info(
      `\n${[...score.quiet, ...score.elsewhere].map((s) => `${s.slug}: ${s.signals} signals in ${s.subgroups} subgroups`).join('\n')}`,
    );
    const subgroups = score.quiet.reduce((sum, stream) => sum + stream.subgroups, 0);
    const signals = score.quiet.reduce((sum, stream) => sum + stream.signals, 0);
    expect(subgroups).toBeGreaterThan(150);
    // One false signal in 92 points on the level chart alone, with known σ (Champ and Woodall 1987); the other charts and
    // limits from 25 subgroups add to that. Far fewer than one in 30 is what a quiet stream must show.
    expect(signals).toBeLessThan(subgroups / 30);
  });

  it('has limits that wait, drawn up by whoever looks round as process owner: four eyes see who that was', async () => {
    const { rows } = await getPool().query<{ author_id: string | null }>(
      `SELECT DISTINCT author_id FROM limit_revision WHERE state = 'draft'`,
    );
    expect(rows).toEqual([{ author_id: demonstrationId('process-owner') }]);
  });
});
