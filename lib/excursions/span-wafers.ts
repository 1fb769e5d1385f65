import type { Pool } from 'pg';
import { TO_MEASURE } from './to-measure-statement';
import type { WaferToMeasure } from './types';

/** A wafer of a shown subgroup; times in milliseconds since 1970. */
export interface SpanWafer {
  id: string;
  subgroupId: string;
  wafer: string;
  runOrLot: string;
  lot: string | null;
  gauge: string | null;
  measuredAt: number;
  recordedAt: number;
  history: boolean;
  /** The control statistic, in the unit of the quantity. */
  value: number | null;
  /** The charted value and the relative s in percent. */
  level: number | null;
  within: number | null;
  sites: number;
  badSites: number;
  notJudgedReason: string | null;
  outOfSpecification: boolean;
  targetId: string | null;
  expected: number | null;
  expectedUncertaintyPercent: number | null;
  ingotFraction: number | null;
  /** An earlier measurement of the same wafer is on record. */
  isMeasuredAgain: boolean;
}

type WaferJson = [
  string,
  string,
  string,
  string,
  string | null,
  string | null,
  number,
  number,
  boolean,
  number | null,
  number | null,
  number | null,
  number,
  number,
  string | null,
  boolean,
  string | null,
  number | null,
  number | null,
  number | null,
  boolean,
];

const milliseconds = (column: string) => `(extract(epoch FROM ${column}) * 1000)::float8`;

const WAFERS = `
SELECT json_agg(json_build_array(w.id::text, w.subgroup_id::text, w.wafer, w.run_or_lot, w.lot, w.gauge,
  ${milliseconds('w.measured_at')}, ${milliseconds('w.recorded_at')}, w.history,
  CASE s.control_statistic WHEN 'areaMean' THEN w.area_mean WHEN 'mean' THEN w.mean ELSE w.median END, w.level,
  w.relative_standard_deviation_percent, w.sites, w.bad_sites, w.not_judged_reason, w.specification <> '{}',
  w.target_revision_id::text, w.expected, w.expected_uncertainty_percent, w.ingot_fraction,
  EXISTS (SELECT FROM wafer_measurement e WHERE e.stream_id = w.stream_id AND e.run_or_lot = w.run_or_lot
    AND e.wafer = w.wafer AND e.measured_at < w.measured_at)) ORDER BY w.processed_at, w.id) AS wafers
FROM wafer_measurement w JOIN stream s ON s.id = w.stream_id
WHERE w.stream_id = $1 AND w.subgroup_id = ANY($2::bigint[])`;

/** The wafers of some subgroups, in the order of processing. */
export async function spanWafers(
  pool: Pool,
  streamId: string,
  subgroupIds: readonly string[],
): Promise<SpanWafer[]> {
  if (subgroupIds.length === 0) return [];
  const { rows } = await pool.query<{ wafers: WaferJson[] | null }>({
    name: 'span-wafers',
    text: WAFERS,
    values: [streamId, subgroupIds],
  });
  return (rows[0]?.wafers ?? []).map(waferOf);
}

function waferOf(json: WaferJson): SpanWafer {
  const [id, subgroupId, wafer, runOrLot, lot, gauge, measuredAt, recordedAt, history, value, level] = json;
  const [within, sites, badSites, notJudgedReason, outOfSpecification, targetId, expected] = json.slice(
    11,
  ) as [number | null, number, number, string | null, boolean, string | null, number | null];
  return {
    id,
    subgroupId,
    wafer,
    runOrLot,
    lot,
    gauge,
    measuredAt,
    recordedAt,
    history,
    value,
    level,
    within,
    sites,
    badSites,
    notJudgedReason,
    outOfSpecification,
    targetId,
    expected,
    expectedUncertaintyPercent: json[18],
    ingotFraction: json[19],
    isMeasuredAgain: json[20],
  };
}

const AGAIN = `
SELECT w.id::text, w.subgroup_id::text AS "subgroupId", w.wafer, w.run_or_lot AS "runOrLot", w.measured_at AS "measuredAt", w.not_judged_reason AS reason
FROM (SELECT unnest(wafer_ids) AS id FROM subgroup WHERE stream_id = $1 AND position_at >= $2 AND position_at <= $3
  AND array_position(wafer_levels, NULL) IS NOT NULL) member
JOIN wafer_measurement w ON w.stream_id = $1 AND w.id = member.id
WHERE ${TO_MEASURE}
ORDER BY w.measured_at DESC LIMIT $4`;

/** A wafer to measure again, and the subgroup it belongs to. */
export type SpanWaferToMeasure = WaferToMeasure & { subgroupId: string };

/** Wafers processed from one instant to another that were recorded, not judged, and not measured again since. */
export async function wafersToMeasure(
  pool: Pool,
  streamId: string,
  span: { from: Date; to: Date; most: number },
): Promise<SpanWaferToMeasure[]> {
  const values = [streamId, span.from, new Date(span.to.getTime() + 1), span.most];
  const { rows } = await pool.query<SpanWaferToMeasure>({ name: 'span-again', text: AGAIN, values });
  return rows;
}
