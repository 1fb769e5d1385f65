import type { Pool } from 'pg';
import { type LimitRow, LIMIT_SELECTION, limitSetOf } from './line-rows';
import { caseSignals, namedSubgroupIds, type SignalRecord, type SubgroupRecord } from './case-signals';
import type { CaseEntry, CaseLimits, CasePoint, CaseSpecification, CaseStream, ExcursionCase } from './types';

/** How many subgroups before the first and after the last of a case are shown with it, and how many at most. */
const BEFORE = 20;
const AFTER = 10;
const MOST = 3000;

type ExcursionRecord = Omit<ExcursionCase, 'stream' | 'first' | 'last' | 'signals' | 'entries' | 'points'> &
  Omit<CaseStream, 'id'> & { streamId: string; firstId: string; lastId: string };

const EXCURSION = `
SELECT e.id, e.chart, e.side, e.family, e.state, e.opened_at AS "openedAt", e.acknowledged_at AS "acknowledgedAt",
  e.acknowledged_by AS "acknowledgedBy", e.closed_at AS "closedAt", e.closed_by AS "closedBy", e.cause,
  e.stream_id AS "streamId", e.first_subgroup_id AS "firstId", e.last_subgroup_id AS "lastId", s.slug, s.name,
  s.subgroup, s.quantity, s.charted_value AS "chartedValue"
FROM excursion e JOIN stream s ON s.id = e.stream_id WHERE e.id = $1`;

const ENTRIES = `
SELECT id, at, actor, action, note FROM excursion_entry WHERE stream_id = $1 AND excursion_id = $2 ORDER BY id`;

const SIGNALS = `
SELECT g.id, g.chart, g.rule, g.side, g.completions, g.participant_ids AS "participantIds",
  g.first_subgroup_id AS "firstId", g.last_subgroup_id AS "lastId", l.revision AS "limitsRevision",
  g.raised_at AS "raisedAt", g.withdrawn_at AS "withdrawnAt", g.withdrawn_reason AS "withdrawnReason"
FROM signal g LEFT JOIN limit_revision l ON l.stream_id = g.stream_id AND l.id = g.limit_revision_id
WHERE g.stream_id = $1 AND g.excursion_id = $2 ORDER BY g.id DESC`;

const SUBGROUPS = `
SELECT p.id, p.key, p.position_at AS at, (SELECT json_agg(json_build_object('id', w.id::text, 'wafer', w.wafer,
    'runOrLot', w.run_or_lot) ORDER BY w.processed_at, w.id)
  FROM wafer_measurement w WHERE w.stream_id = p.stream_id AND w.subgroup_id = p.id) AS wafers
FROM subgroup p WHERE p.stream_id = $1 AND p.id = ANY($2::bigint[]) ORDER BY p.position_at, p.key`;

const POINT = `id, key, position_at AS at, state, level, moving_range AS "movingRange", within, between,
  limit_revision_id AS "limitsId", completions, specification <> '{}' AS "outOfSpecification",
  cardinality(array_remove(wafer_levels, NULL)) AS wafers, wafer_ids[1] AS "firstWaferId"`;

/** $2, $3 and $4, $5 are the places of the first and last subgroup that the case names. */
const POINTS = `
SELECT ${POINT} FROM (
  (SELECT * FROM subgroup WHERE stream_id = $1 AND (position_at, key) < ($2, $3)
    ORDER BY position_at DESC, key DESC LIMIT ${BEFORE})
  UNION ALL
  (SELECT * FROM subgroup WHERE stream_id = $1 AND (position_at, key) >= ($2, $3) AND (position_at, key) <= ($4, $5)
    ORDER BY position_at DESC, key DESC LIMIT ${MOST})
  UNION ALL
  (SELECT * FROM subgroup WHERE stream_id = $1 AND (position_at, key) > ($4, $5)
    ORDER BY position_at, key LIMIT ${AFTER})) p ORDER BY at, key`;

const LIMITS = `SELECT ${LIMIT_SELECTION}, state FROM limit_revision WHERE stream_id = $1 AND id = ANY($2::bigint[])`;

const EVENTS = `
SELECT at, kind, text FROM stream_event WHERE stream_id = $1 AND at >= $2 AND at <= $3 ORDER BY at, id`;

const SPECIFICATIONS = `
SELECT revision, effective_from AS "effectiveFrom", mean_lower AS "meanLower", mean_upper AS "meanUpper",
  nonuniformity_metric AS "nonuniformityMetric", nonuniformity_upper AS "nonuniformityUpper"
FROM specification_revision WHERE stream_id = $1 ORDER BY revision`;

/** One excursion with its signals, its log, and the subgroups about it; null when there is none. */
export async function excursionCase(pool: Pool, id: string): Promise<ExcursionCase | null> {
  const [found] = (await pool.query<ExcursionRecord>(EXCURSION, [id])).rows;
  if (found === undefined) return null;
  const { streamId, firstId, lastId, slug, name, subgroup, quantity, chartedValue, ...rest } = found;
  const [entries, signals] = await Promise.all([
    pool.query<CaseEntry>(ENTRIES, [streamId, id]),
    pool.query<SignalRecord>(SIGNALS, [streamId, id]),
  ]);
  const ids = [...new Set([firstId, lastId, ...namedSubgroupIds(signals.rows)])];
  const named = (await pool.query<SubgroupRecord>(SUBGROUPS, [streamId, ids])).rows;
  const byId = new Map(named.map((one) => [one.id, { ...one, wafers: one.wafers ?? [] }]));
  const [first, last] = [byId.get(firstId), byId.get(lastId)];
  const [earliest, latest] = [named[0], named.at(-1)];
  if (!first || !last || !earliest || !latest) return null;
  const around = [streamId, earliest.at, earliest.key, latest.at, latest.key];
  const points = (await pool.query<CasePoint>(POINTS, around)).rows;
  const [from, to] = [points[0]?.at ?? earliest.at, points.at(-1)?.at ?? latest.at];
  const [limits, events, specifications] = await Promise.all([
    pool.query<LimitRow & Pick<CaseLimits, 'state'>>(LIMITS, [
      streamId,
      [...new Set(points.flatMap((point) => point.limitsId ?? []))],
    ]),
    pool.query<ExcursionCase['events'][number]>(EVENTS, [streamId, from, to]),
    pool.query<CaseSpecification>(SPECIFICATIONS, [streamId]),
  ]);
  return {
    ...rest,
    stream: { id: streamId, slug, name, subgroup, quantity, chartedValue },
    first,
    last,
    signals: caseSignals(signals.rows, byId),
    entries: entries.rows,
    points,
    limits: limits.rows.map((row) => ({
      id: row.id,
      revision: row.revision,
      state: row.state,
      limits: limitSetOf(row),
    })),
    events: events.rows,
    specifications: specifications.rows,
  };
}
