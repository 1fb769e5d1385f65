import type { ClientBase, Pool } from 'pg';
import type { Actor } from '@/lib/access/actor';

/** A recorded wafer with what measuring it again needs: its facts, its readings as sent, a person's word on sites. */
export interface StoredWafer {
  id: string;
  subgroupId: string;
  runOrLot: string;
  wafer: string;
  facts: {
    processedAt: Date;
    ingotFraction: number | null;
    thicknessUm: number | null;
    temperatureC: number | null;
    correctionsApplied: string[];
  };
  screening: 'off' | 'impossible' | 'outliers';
  readings: (number | null)[];
  overrides: Map<number, 'in' | 'out'>;
}

interface Row {
  id: string;
  subgroup_id: string;
  run_or_lot: string;
  wafer: string;
  processed_at: Date;
  ingot_fraction: number | null;
  thickness_um: number | null;
  temperature_c: number | null;
  corrections_applied: string;
  screening: StoredWafer['screening'];
  reading: (number | null)[];
  overrides: { site: number; action: 'in' | 'out' }[] | null;
}

/** Recorded wafers of one stream by their ids; the latest word on each site counts. */
export async function loadStoredWafers(
  _actor: Actor,
  client: ClientBase | Pool,
  streamId: string,
  ids: readonly string[],
): Promise<Map<string, StoredWafer>> {
  const { rows } = await client.query<Row>(
    `SELECT w.id, w.subgroup_id, w.run_or_lot, w.wafer, w.processed_at, w.ingot_fraction, w.thickness_um, w.temperature_c,
       w.corrections_applied, w.screening, r.reading,
       (SELECT json_agg(json_build_object('site', e.site_index, 'action', e.action) ORDER BY e.id)
        FROM reading_exclusion e WHERE e.stream_id = w.stream_id AND e.wafer_id = w.id) AS overrides
     FROM wafer_measurement w JOIN wafer_reading r ON r.stream_id = w.stream_id AND r.wafer_id = w.id
     WHERE w.stream_id = $1 AND w.id = ANY($2::bigint[])`,
    [streamId, ids],
  );
  return new Map(
    rows.map((row) => [
      row.id,
      {
        id: row.id,
        subgroupId: row.subgroup_id,
        runOrLot: row.run_or_lot,
        wafer: row.wafer,
        facts: {
          processedAt: row.processed_at,
          ingotFraction: row.ingot_fraction,
          thicknessUm: row.thickness_um,
          temperatureC: row.temperature_c,
          correctionsApplied: row.corrections_applied === 'none' ? [] : row.corrections_applied.split(' '),
        },
        screening: row.screening,
        readings: row.reading,
        overrides: new Map((row.overrides ?? []).map(({ site, action }) => [site, action])),
      },
    ]),
  );
}
