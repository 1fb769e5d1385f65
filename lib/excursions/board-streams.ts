import type { Pool } from 'pg';
import { type BoardStreamRow, boardStreamOf } from './board-stream-rows';
import { LEAD_SIGNAL } from './lead-signal-statement';
import { TO_MEASURE } from './to-measure-statement';
import type { BoardStream } from './types';

/** How many levels a row of the board shows. */
export const BOARD_POINTS = 30;

/**
 * One statement, so that the board is one snapshot, and every part of it once a stream, whatever the planner guesses.
 * What grows with a stream's history is reached by index and cut off: its last subgroups by `subgroup_position`, cases
 * not closed by `excursion_open`. Readings are not touched. Where a gauge's clock runs ahead, now is the time of the
 * newest subgroup. Rows are packed as JSON, which the driver reads several times faster than as many columns.
 */
const STATEMENT = `
SELECT s.id, s.slug, s.name, s.step, s.tool, s.chamber, s.recipe, s.quantity, s.charted_value, plan.diameter_mm,
  strip.points, newest.wafer AS newest, charted.facts AS charted, again.wafers AS again, target.target, limits.limits,
  coalesce(cases.open_cases, 0) AS open_cases, coalesce(cases.unanswered_cases, 0) AS unanswered_cases,
  cases.oldest_unanswered_at, CASE WHEN worst.id IS NOT NULL THEN json_build_object('id', worst.id::text,
    'chart', worst.chart, 'family', worst.family, 'state', worst.state, 'openedAt', worst.opened_at,
    'acknowledgedBy', worst.acknowledged_by, 'limitsId', worst.point_limit_id::text,
    'signal', CASE WHEN worst.rule IS NOT NULL THEN json_build_object('chart', worst.signal_chart, 'rule', worst.rule,
      'side', worst.signal_side, 'completions', worst.completions, 'participantIds', worst.participant_ids::text[]) END,
    'at', CASE WHEN worst.point_id IS NOT NULL THEN json_build_object('level', worst.level,
      'movingRange', worst.moving_range, 'within', worst.within, 'between', worst.between) END) END AS worst
FROM stream s
JOIN site_plan plan ON plan.id = s.site_plan_id
CROSS JOIN LATERAL (
  SELECT greatest(now(), max(position_at)) AS now, array_agg(DISTINCT limit_revision_id) AS limit_ids,
    json_agg(json_build_array(state, level, within, limit_revision_id::text,
      CASE WHEN completions <> '{}' THEN completions END, CASE WHEN specification <> '{}' THEN specification END)
      ORDER BY position_at, key) AS points,
    (array_agg(id ORDER BY position_at DESC, key DESC))[1] AS newest_id,
    (array_agg(id ORDER BY position_at DESC, key DESC) FILTER (WHERE level IS NOT NULL))[1] AS charted_id,
    array_agg(id) FILTER (WHERE array_position(wafer_levels, NULL) IS NOT NULL) AS gap_ids
  FROM (SELECT * FROM subgroup WHERE stream_id = s.id
    ORDER BY position_at DESC, key DESC LIMIT ${BOARD_POINTS}) recent) strip
LEFT JOIN LATERAL (
  SELECT json_build_array(w.id::text, w.wafer, w.run_or_lot, w.measured_at) AS wafer FROM wafer_measurement w
  WHERE w.stream_id = s.id AND w.subgroup_id = strip.newest_id
  ORDER BY w.processed_at DESC, w.id DESC LIMIT 1) newest ON true
LEFT JOIN LATERAL (
  SELECT last.target_revision_id AS target_id, json_build_array(
    CASE WHEN last.least = last.most THEN last.expected END, last.expected_uncertainty_percent, last.fraction) AS facts
  FROM (SELECT w.*, min(expected) OVER () AS least, max(expected) OVER () AS most, avg(ingot_fraction) OVER () AS fraction
    FROM wafer_measurement w WHERE w.stream_id = s.id AND w.subgroup_id = strip.charted_id AND w.level IS NOT NULL
      AND w.expected IS NOT NULL
    ORDER BY w.processed_at DESC, w.id DESC LIMIT 1) last
  WHERE last.expected_uncertainty_percent IS NOT NULL) charted ON true
CROSS JOIN LATERAL (
  SELECT json_agg(json_build_array(w.id::text, w.wafer, w.run_or_lot, w.measured_at, w.not_judged_reason)
    ORDER BY w.measured_at DESC) AS wafers
  FROM wafer_measurement w
  WHERE w.stream_id = s.id AND w.subgroup_id = ANY(strip.gap_ids) AND ${TO_MEASURE}) again
LEFT JOIN LATERAL (
  SELECT jsonb_build_object('id', t.id::text, 'dopant', dopant, 'densityPerCm3', density_per_cm3,
    'tolerancePercent', tolerance_percent, 'alongCrystal', along_crystal, 'profile', profile, 'lengthUm', length_um,
    'backgroundDopant', background_dopant, 'backgroundDensityPerCm3', background_density_per_cm3,
    'calibrationFactor', calibration_factor, 'calibrationPercent', calibration_percent) ||
    jsonb_strip_nulls(jsonb_build_object('counterDopant', counter_dopant, 'counterDensityPerCm3', counter_density_per_cm3,
    'rangeUm', range_um, 'driveInC', drive_in_c, 'driveInMin', drive_in_min, 'pairs', profile_pairs,
    'temperatureCoefficientPercentPerC', temperature_coefficient_percent_per_c, 'method', method)) AS target
  FROM target_revision t WHERE t.stream_id = s.id AND t.id = charted.target_id) target ON true
LEFT JOIN (
  SELECT stream_id, count(*)::integer AS open_cases, (count(*) FILTER (WHERE state = 'open'))::integer AS unanswered_cases,
    min(opened_at) FILTER (WHERE state = 'open') AS oldest_unanswered_at,
    max(ARRAY[(family = 'specification')::integer, (state = 'open')::integer, id]::bigint[]) AS rank
  FROM excursion WHERE state <> 'closed' GROUP BY stream_id) cases ON cases.stream_id = s.id
LEFT JOIN LATERAL (
  SELECT e.*, g.chart AS signal_chart, g.rule, g.side AS signal_side, g.completions, g.participant_ids, p.id AS point_id,
    p.level, p.moving_range, p.within, p.between, p.limit_revision_id AS point_limit_id
  FROM excursion e
  LEFT JOIN LATERAL (${LEAD_SIGNAL}) g ON true
  LEFT JOIN subgroup p ON p.stream_id = g.stream_id AND p.id = g.last_subgroup_id
  WHERE e.stream_id = s.id AND e.id = cases.rank[3]) worst ON true
CROSS JOIN LATERAL (
  SELECT json_agg(${limitsAsJson('l')} ORDER BY from_last = 1, l.effective_from, l.revision) AS limits
  FROM (SELECT *, row_number() OVER (ORDER BY effective_from, revision) AS from_first,
      row_number() OVER (ORDER BY coalesce(superseded_from <= strip.now, false), effective_from DESC,
        revision DESC) AS from_last
    FROM limit_revision
    WHERE stream_id = s.id AND state IN ('provisional', 'approved') AND effective_from <= strip.now) l
  WHERE from_first = 1 OR from_last = 1 OR l.id = worst.point_limit_id OR l.id = ANY(strip.limit_ids)) limits
WHERE s.retired_at IS NULL ORDER BY s.name, s.id`;

/** Every stream in use, by name, as the board shows it. */
export async function boardStreams(pool: Pool): Promise<BoardStream[]> {
  const { rows } = await pool.query<BoardStreamRow>({ name: 'board-streams', text: STATEMENT });
  return rows.map(boardStreamOf);
}

/** A limit revision as the JSON that `boardLimitsOf` reads. */
function limitsAsJson(table: string): string {
  const columns = {
    id: 'id::text',
    state: 'state',
    origin: 'origin',
    subgroups: 'subgroups',
    centre: 'centre',
    sigma: 'sigma',
    lower: 'lower',
    upper: 'upper',
    movingRangeCentre: 'moving_range_centre',
    movingRangeUpper: 'moving_range_upper',
    withinLogMean: 'within_log_mean',
    withinLogSigma: 'within_log_sigma',
    withinLower: 'within_lower',
    withinCentre: 'within_centre',
    withinUpper: 'within_upper',
    betweenCentre: 'between_centre',
    betweenUpper: 'between_upper',
    betweenWafers: 'between_wafers',
  };
  const pairs = Object.entries(columns).map(([name, column]) => `'${name}', ${table}.${column}`);
  return `json_build_object(${pairs.join(', ')})`;
}
