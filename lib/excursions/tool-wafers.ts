import type { Pool } from 'pg';

/** A wafer of one of a tool's streams, as one scale for the tool needs it; time in milliseconds since 1970. */
export interface ToolWafer {
  id: string;
  streamId: string;
  wafer: string;
  at: number;
  /** The control statistic over what was expected of the wafer. */
  ratio: number;
  expectedUncertaintyPercent: number;
  targetId: string;
  ingotFraction: number | null;
}

/** How many of the last subgroups of each stream are looked at. */
const LAST = 60;

const STATEMENT = `
SELECT w.id::text, w.stream_id::text AS "streamId", w.wafer, (extract(epoch FROM w.processed_at) * 1000)::float8 AS at,
  CASE s.control_statistic WHEN 'areaMean' THEN w.area_mean WHEN 'mean' THEN w.mean ELSE w.median END / w.expected AS ratio,
  w.expected_uncertainty_percent AS "expectedUncertaintyPercent", w.target_revision_id::text AS "targetId",
  w.ingot_fraction AS "ingotFraction"
FROM unnest($1::bigint[]) AS wanted (id)
JOIN stream s ON s.id = wanted.id
CROSS JOIN LATERAL (SELECT id FROM subgroup WHERE stream_id = s.id AND state = 'judged'
  ORDER BY position_at DESC, key DESC LIMIT ${LAST}) p
JOIN wafer_measurement w ON w.stream_id = s.id AND w.subgroup_id = p.id
WHERE w.level IS NOT NULL AND w.expected > 0 AND w.expected_uncertainty_percent IS NOT NULL
  AND w.target_revision_id IS NOT NULL
ORDER BY w.processed_at, w.id`;

/** The charted wafers of the last subgroups of some streams of which something was expected, in the order of processing. */
export async function toolWafers(pool: Pool, streamIds: readonly string[]): Promise<ToolWafer[]> {
  const { rows } = await pool.query<ToolWafer>({ name: 'tool-wafers', text: STATEMENT, values: [streamIds] });
  return rows;
}
