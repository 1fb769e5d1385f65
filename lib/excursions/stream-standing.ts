import type { Pool } from 'pg';
import type { LimitSet } from '@/lib/control/limit-set';
import type { ExcursionFamily } from './line';
import { limitsInForce } from './judged-points';
import { LEAD_SIGNAL } from './lead-signal-statement';
import { LIMIT_SELECTION, type LimitRow, limitSetOf } from './line-rows';
import type { ExcursionState, SignalWords } from './types';

/** A limit revision that judges or judged, with who drew it up. */
export interface StandingLimits {
  id: string;
  revision: number;
  state: 'provisional' | 'approved';
  origin: string;
  effectiveFrom: Date;
  supersededFrom: Date | null;
  limits: LimitSet;
  author: string;
  draftedAt: Date;
  approvedBy: string | null;
  approvedAt: Date | null;
}

/** A case that is not closed, with the signal that speaks for it (`LEAD_SIGNAL`); the keys name subgroups. */
export interface StandingCase {
  id: string;
  family: ExcursionFamily;
  state: ExcursionState;
  openedAt: Date;
  acknowledgedBy: string | null;
  signal:
    | (SignalWords & {
        first: { id: string; key: string };
        last: { id: string; key: string; isNewest: boolean };
      })
    | null;
}

/** How a stream stands now, whatever stretch of it is looked at. */
export interface StreamStanding {
  /** Every revision that judges or judged, the one that takes effect last first. */
  limits: StandingLimits[];
  inForce: StandingLimits | null;
  /** Out of specification first, then unanswered, then the newest; a few of `openCases`. */
  cases: StandingCase[];
  openCases: number;
  /**
   * Subgroups judged since the limits in force took effect (ever, where there are none), counted up to one more than
   * `SINCE_MOST`, and how many of the last `SINCE_MOST` of them have a signal.
   */
  since: { subgroups: number; withSignal: number };
  /** The levels of the baseline of the limits in force, in order. */
  baselineLevels: number[];
}

/** Counting ends here: "over 500" tells as much. */
export const SINCE_MOST = 500;

const CASES_READ = 6;
const BASELINE_READ = 500;

type LimitsRow = LimitRow &
  Omit<StandingLimits, 'id' | 'revision' | 'effectiveFrom' | 'supersededFrom' | 'limits'>;

const LIMITS = `SELECT ${LIMIT_SELECTION}, state, origin, author, drafted_at AS "draftedAt", approved_by AS "approvedBy",
  approved_at AS "approvedAt" FROM limit_revision WHERE stream_id = $1 AND state IN ('provisional', 'approved')
  ORDER BY effective_from DESC, revision DESC`;

const CASES = `
SELECT e.id::text, e.family, e.state, e.opened_at AS "openedAt", e.acknowledged_by AS "acknowledgedBy", found.signal,
  (SELECT count(*)::integer FROM excursion c WHERE c.stream_id = $1 AND c.state <> 'closed') AS total
FROM (SELECT * FROM excursion x WHERE x.stream_id = $1 AND x.state <> 'closed'
  ORDER BY x.family = 'specification' DESC, x.state = 'open' DESC, x.id DESC LIMIT ${CASES_READ}) e
LEFT JOIN LATERAL (
  SELECT json_build_object('chart', g.chart, 'rule', g.rule, 'side', g.side, 'completions', g.completions,
    'participantIds', g.participant_ids::text[],
    'first', (SELECT json_build_object('id', f.id::text, 'key', f.key) FROM subgroup f
      WHERE f.stream_id = g.stream_id AND f.id = g.participant_ids[1]),
    'last', json_build_object('id', p.id::text, 'key', p.key, 'isNewest', NOT EXISTS (
      SELECT FROM subgroup n WHERE n.stream_id = p.stream_id AND (n.position_at, n.key) > (p.position_at, p.key)
        AND n.state = 'judged'))) AS signal
  FROM (${LEAD_SIGNAL}) g JOIN subgroup p ON p.stream_id = g.stream_id AND p.id = g.last_subgroup_id) found ON true
ORDER BY e.family = 'specification' DESC, e.state = 'open' DESC, e.id DESC`;

const SINCE = `
SELECT count(*)::integer AS subgroups,
  (count(*) FILTER (WHERE back <= ${SINCE_MOST} AND (completions <> '{}' OR specification <> '{}')))::integer AS "withSignal"
FROM (SELECT completions, specification, row_number() OVER (ORDER BY position_at DESC, key DESC) AS back FROM subgroup WHERE stream_id = $1 AND position_at > $2 AND state = 'judged'
  ORDER BY position_at DESC, key DESC LIMIT ${SINCE_MOST + 1}) s`;

const BASELINE = `
SELECT array_agg(level ORDER BY position_at, key) AS levels FROM (SELECT level, position_at, key FROM subgroup
  WHERE stream_id = $1 AND id = ANY($2::bigint[]) AND level IS NOT NULL
  ORDER BY position_at DESC, key DESC LIMIT ${BASELINE_READ}) s`;

export async function streamStanding(pool: Pool, streamId: string, now: Date): Promise<StreamStanding> {
  const [found, cases] = await Promise.all([
    pool.query<LimitsRow>({ name: 'standing-limits', text: LIMITS, values: [streamId] }),
    pool.query<StandingCase & { total: number }>({ name: 'standing-cases', text: CASES, values: [streamId] }),
  ]);
  const row = limitsInForce(found.rows, now.getTime());
  const sinceAt = row?.effectiveFrom.toISOString() ?? '-infinity';
  const [since, baseline] = await Promise.all([
    pool.query<StreamStanding['since']>({ name: 'standing-since', text: SINCE, values: [streamId, sinceAt] }),
    pool.query<{ levels: number[] | null }>({
      name: 'standing-baseline',
      text: BASELINE,
      values: [streamId, row?.baselineIds ?? []],
    }),
  ]);
  return {
    limits: found.rows.map(limitsOf),
    inForce: row && limitsOf(row),
    cases: cases.rows.map(({ total: _total, ...one }) => one),
    openCases: cases.rows[0]?.total ?? 0,
    since: since.rows[0] ?? { subgroups: 0, withSignal: 0 },
    baselineLevels: baseline.rows[0]?.levels ?? [],
  };
}

function limitsOf(row: LimitsRow): StandingLimits {
  const { id, revision, state, origin, effectiveFrom, supersededFrom } = row;
  const { author, draftedAt, approvedBy, approvedAt } = row;
  return {
    id,
    revision,
    state,
    origin,
    effectiveFrom,
    supersededFrom,
    limits: limitSetOf(row),
    author,
    draftedAt,
    approvedBy,
    approvedAt,
  };
}
