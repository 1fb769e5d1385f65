import type { Pool } from 'pg';
import { LEAST_USUAL_WAFERS } from '@/lib/wafer/usual-map';
import type { UsualWafers, WaferRecord } from './wafer-record';
import { correctionsOf } from './wafer-record-row';

interface Row {
  revision: number | null;
  /** A reading that is no number comes as a word. */
  reading: (number | string | null)[];
  bad_site_indices: number[];
  corrections_applied: string;
  temperature_c: number | null;
}

const MOST_BASELINE_WAFERS = 75;
const MOST_LATEST_WAFERS = 25;

/** Readings come as JSON, which is read several times faster than an array column. */
const SELECTION = `to_json(r.reading) AS reading, w.bad_site_indices, w.corrections_applied, w.temperature_c`;
const READINGS = `JOIN wafer_reading r ON r.stream_id = w.stream_id AND r.wafer_id = w.id`;

const FROM_BASELINE = `
SELECT l.revision, ${SELECTION}
FROM limit_revision l CROSS JOIN LATERAL unnest(l.baseline_ids) WITH ORDINALITY AS base (id, place)
JOIN wafer_measurement w ON w.stream_id = l.stream_id AND w.subgroup_id = base.id
${READINGS}
WHERE l.stream_id = $1 AND l.id = $2 AND w.level IS NOT NULL AND w.id <> $3
ORDER BY base.place DESC, w.processed_at DESC, w.id DESC LIMIT ${MOST_BASELINE_WAFERS}`;

const LATEST = `
SELECT NULL AS revision, ${SELECTION}
FROM (SELECT stream_id, id, position_at, key FROM subgroup
  WHERE stream_id = $1 AND state = 'judged' AND (position_at, key) < ($2, $3)
  ORDER BY position_at DESC, key DESC LIMIT ${MOST_LATEST_WAFERS}) s
JOIN wafer_measurement w ON w.stream_id = s.stream_id AND w.subgroup_id = s.id
${READINGS}
WHERE w.level IS NOT NULL
ORDER BY s.position_at DESC, s.key DESC, w.processed_at DESC, w.id DESC LIMIT ${MOST_LATEST_WAFERS}`;

/**
 * The wafers that say what is usual: the baseline of the limits this wafer is judged by, because a pattern that grows
 * slowly would drag the latest ones along; the latest before it where there is no such baseline.
 */
export async function readUsualWafers(pool: Pool, wafer: WaferRecord): Promise<UsualWafers> {
  const { id, streamId, subgroup } = wafer;
  if (subgroup.limitRevisionId !== null) {
    const { rows } = await pool.query<Row>(FROM_BASELINE, [streamId, subgroup.limitRevisionId, id]);
    if (rows.length >= LEAST_USUAL_WAFERS) {
      return { from: 'baseline', revision: rows[0]?.revision ?? null, wafers: rows.map(usualWafer) };
    }
  }
  const { rows } = await pool.query<Row>(LATEST, [streamId, subgroup.positionAt, subgroup.key]);
  return { from: 'latest', revision: null, wafers: rows.map(usualWafer) };
}

function usualWafer(row: Row): UsualWafers['wafers'][number] {
  return {
    readings: row.reading.map((value) => (typeof value === 'number' ? value : null)),
    badSites: row.bad_site_indices,
    correctionsApplied: correctionsOf(row.corrections_applied),
    temperatureC: row.temperature_c,
  };
}
