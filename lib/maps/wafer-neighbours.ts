import type { Pool } from 'pg';
import type { WaferNeighbour, WaferRecord } from './wafer-record';

interface Row {
  place: 'here' | 'before' | 'after';
  id: string;
  wafer: string;
  slot: number | null;
  run_or_lot: string;
  processed_at: Date;
  area_mean: number | null;
  mean: number | null;
  median: number | null;
  relative_standard_deviation_percent: number | null;
  not_judged_reason: string | null;
  is_out: boolean;
}

const nearest = (sign: '<' | '>', order: 'ASC' | 'DESC') => `
  (SELECT id FROM subgroup WHERE stream_id = $1 AND (position_at, key) ${sign} ($3, $4)
   ORDER BY position_at ${order}, key ${order} LIMIT 1)`;

/** Within a subgroup wafers follow each other as they were processed, whatever the order in which they came here. */
const STATEMENT = `
SELECT near.place, w.id, w.wafer, w.slot, w.run_or_lot, w.processed_at, w.area_mean, w.mean, w.median,
  w.relative_standard_deviation_percent, w.not_judged_reason, w.specification <> '{}' AS is_out
FROM (VALUES ('before', ${nearest('<', 'DESC')}), ('here', $2::bigint), ('after', ${nearest('>', 'ASC')})) near (place, id)
JOIN wafer_measurement w ON w.stream_id = $1 AND w.subgroup_id = near.id
ORDER BY w.processed_at, w.slot NULLS LAST, w.wafer COLLATE "C", w.measured_at, w.id`;

/** The wafers of the same subgroup, and those before and after in the order of the stream. */
export async function readWaferNeighbours(
  pool: Pool,
  { id, streamId, subgroup }: WaferRecord,
): Promise<{ siblings: WaferNeighbour[]; previous: WaferNeighbour | null; next: WaferNeighbour | null }> {
  const parameters = [streamId, subgroup.id, subgroup.positionAt, subgroup.key];
  const { rows } = await pool.query<Row>(STATEMENT, parameters);
  const at = (place: Row['place']) => rows.filter((row) => row.place === place).map(neighbourOf);
  const siblings = at('here');
  const own = siblings.findIndex((sibling) => sibling.id === id);
  return {
    siblings,
    previous: siblings[own - 1] ?? at('before').at(-1) ?? null,
    next: siblings[own + 1] ?? at('after')[0] ?? null,
  };
}

function neighbourOf(row: Row): WaferNeighbour {
  return {
    id: row.id,
    wafer: row.wafer,
    slot: row.slot,
    runOrLot: row.run_or_lot,
    processedAt: row.processed_at,
    areaMean: row.area_mean,
    mean: row.mean,
    median: row.median,
    relativeStandardDeviationPercent: row.relative_standard_deviation_percent,
    notJudgedReason: row.not_judged_reason,
    isOutOfSpecification: row.is_out,
  };
}
