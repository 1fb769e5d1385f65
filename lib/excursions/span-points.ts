import type { Pool } from 'pg';
import type { ChartedFigures } from './types';
import type { LinePoint } from './line';

/** How many subgroups are shown where nobody asked for a stretch of time. */
export const USUAL_SUBGROUPS = 200;

/** The most subgroups one look reads, however long the stretch: of a longer one the newest. */
export const MOST_SUBGROUPS = 20_000;

/** Which stretch of a stream to read. `around` is a subgroup to show with its surroundings, by id. */
export interface SpanWish {
  from: Date | null;
  to: Date | null;
  around: string | null;
  gauge: string | null;
  lot: string | null;
}

/** One subgroup, as narrow as the charts can be drawn from; `at` in milliseconds since 1970. */
export interface SpanPoint extends ChartedFigures {
  id: string;
  key: string;
  at: number;
  state: LinePoint['state'];
  limitsId: string | null;
  completions: readonly string[];
  outOfSpecification: boolean;
  /** How many of its wafers count. */
  wafers: number;
}

export interface StreamSpan {
  /** In the order of processing; only those that match gauge and lot, where these were asked for. */
  points: SpanPoint[];
  /** How many subgroups the stretch holds, matching or not. */
  inSpan: number;
  /** The stretch holds more than one look reads. */
  isCut: boolean;
  /** From the stream's first subgroup to its last; null without any. */
  whole: { from: Date; to: Date } | null;
}

type PointJson = [
  id: string,
  key: string,
  at: number,
  state: LinePoint['state'],
  level: number | null,
  movingRange: number | null,
  within: number | null,
  between: number | null,
  limitsId: string | null,
  completions: string[] | null,
  outOfSpecification: boolean,
  wafers: number,
  matches: boolean,
];

/**
 * Every source is cut off by index (`subgroup_position`), so that a look costs what it shows and not what the stream
 * has behind it. Packed as JSON, which the driver reads several times faster than as many columns.
 */
const statement = (source: string, matches: string) => `
SELECT json_agg(json_build_array(p.id::text, p.key, (extract(epoch FROM p.position_at) * 1000)::float8, p.state, p.level,
  p.moving_range, p.within, p.between, p.limit_revision_id::text, CASE WHEN p.completions <> '{}' THEN p.completions END,
  p.specification <> '{}', cardinality(array_remove(p.wafer_levels, NULL)), ${matches}) ORDER BY p.position_at, p.key) AS points,
  (SELECT position_at FROM subgroup WHERE stream_id = $1 ORDER BY position_at, key LIMIT 1) AS first_at,
  (SELECT position_at FROM subgroup WHERE stream_id = $1 ORDER BY position_at DESC, key DESC LIMIT 1) AS last_at
FROM (${source}) p`;

/** The newest subgroups from one instant to another, the last millisecond included. */
const STRETCH = `SELECT * FROM subgroup WHERE stream_id = $1 AND position_at >= $2::timestamptz
  AND position_at < $3::timestamptz + interval '1 millisecond' ORDER BY position_at DESC, key DESC LIMIT $4`;

const AROUND = `SELECT near.* FROM (SELECT position_at, key FROM subgroup WHERE stream_id = $1 AND id = $2) middle
  CROSS JOIN LATERAL (
    (SELECT * FROM subgroup s WHERE s.stream_id = $1 AND (s.position_at, s.key) <= (middle.position_at, middle.key)
     ORDER BY s.position_at DESC, s.key DESC LIMIT $3)
    UNION ALL
    (SELECT * FROM subgroup s WHERE s.stream_id = $1 AND (s.position_at, s.key) > (middle.position_at, middle.key)
     ORDER BY s.position_at, s.key LIMIT $4)) near`;

const matching = (gauge: number, lot: number) => `EXISTS (SELECT FROM wafer_measurement w
  WHERE w.stream_id = p.stream_id AND w.id = ANY(p.wafer_ids)
    AND ($${gauge}::text IS NULL OR w.gauge = $${gauge}) AND ($${lot}::text IS NULL OR w.lot = $${lot}))`;

/** Of a stretch about one subgroup three quarters lie before it: what led to it matters more. */
const BEFORE = (USUAL_SUBGROUPS * 3) / 4;

/** The subgroups of a stretch; with neither `from` nor `to` the newest, or those about `around` where it is older. */
export async function spanPoints(pool: Pool, streamId: string, wish: SpanWish): Promise<StreamSpan> {
  const { from, to, around } = wish;
  const most = from === null ? USUAL_SUBGROUPS : MOST_SUBGROUPS + 1;
  const bounds = [from?.toISOString() ?? '-infinity', to?.toISOString() ?? 'infinity', most];
  const newest = await read(pool, 'stretch', STRETCH, [streamId, ...bounds], wish);
  const isThere = around === null || newest.points.some((point) => point.id === around);
  if (isThere || from !== null || to !== null) return newest;
  const about = await read(
    pool,
    'around',
    AROUND,
    [streamId, around, BEFORE, USUAL_SUBGROUPS - BEFORE],
    wish,
  );
  return about.inSpan === 0 ? newest : about;
}

async function read(
  pool: Pool,
  name: string,
  source: string,
  values: unknown[],
  { gauge, lot }: SpanWish,
): Promise<StreamSpan> {
  const isFiltered = gauge !== null || lot !== null;
  const { rows } = await pool.query<{
    points: PointJson[] | null;
    first_at: Date | null;
    last_at: Date | null;
  }>({
    name: `span-${name}${isFiltered ? '-filtered' : ''}`,
    text: statement(source, isFiltered ? matching(values.length + 1, values.length + 2) : 'true'),
    values: isFiltered ? [...values, gauge, lot] : values,
  });
  const row = rows[0];
  const found = row?.points ?? [];
  const isCut = found.length > MOST_SUBGROUPS;
  const kept = isCut ? found.slice(1) : found;
  const [first, last] = [row?.first_at ?? null, row?.last_at ?? null];
  return {
    points: kept.filter((point) => point[12]).map(pointOf),
    inSpan: kept.length,
    isCut,
    whole: first === null || last === null ? null : { from: first, to: last },
  };
}

function pointOf(json: PointJson): SpanPoint {
  const [id, key, at, state, level, movingRange, within, between, limitsId, completions, faulty, wafers] =
    json;
  return {
    id,
    key,
    at,
    state,
    level,
    movingRange,
    within,
    between,
    limitsId,
    completions: completions ?? [],
    outOfSpecification: faulty,
    wafers,
  };
}
