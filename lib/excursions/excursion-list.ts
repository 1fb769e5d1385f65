import type { Pool } from 'pg';
import { LEAD_SIGNAL } from './lead-signal-statement';
import type { ExcursionFilter, ExcursionList, ExcursionState, ListedExcursion, SignalWords } from './types';

export interface ExcursionWish {
  state: ExcursionFilter;
  /** The name of a stream in addresses; null for all. */
  stream: string | null;
  skip: number;
  most: number;
}

interface ExcursionRow extends Omit<ListedExcursion, 'stream' | 'first' | 'last'> {
  slug: string;
  name: string;
  subgroup: ListedExcursion['stream']['subgroup'];
  firstKey: string;
  firstAt: Date;
  lastKey: string;
  lastAt: Date;
  signal: SignalWords | null;
}

const LIST = `
SELECT e.id, s.slug, s.name, s.subgroup, e.chart, e.family, e.side, e.state, e.opened_at AS "openedAt",
  e.acknowledged_by AS "acknowledgedBy", e.closed_at AS "closedAt", e.closed_by AS "closedBy", e.cause,
  a.key AS "firstKey", a.position_at AS "firstAt", z.key AS "lastKey", z.position_at AS "lastAt",
  held.signal, (SELECT count(*)::integer FROM signal n WHERE n.stream_id = e.stream_id AND n.excursion_id = e.id) AS signals
FROM (SELECT x.* FROM excursion x JOIN stream o ON o.id = x.stream_id
  WHERE ($1 = 'all' OR x.state = $1 OR ($1 = 'unclosed' AND x.state <> 'closed')) AND ($2::text IS NULL OR o.slug = $2)
  ORDER BY array_position('{open,acknowledged,under-investigation,closed}', x.state), x.opened_at DESC, x.id DESC
  LIMIT $3 OFFSET $4) e
JOIN stream s ON s.id = e.stream_id
JOIN subgroup a ON a.stream_id = e.stream_id AND a.id = e.first_subgroup_id
JOIN subgroup z ON z.stream_id = e.stream_id AND z.id = e.last_subgroup_id
LEFT JOIN LATERAL (
  SELECT json_build_object('chart', g.chart, 'rule', g.rule, 'side', g.side, 'completions', g.completions,
    'participantIds', g.participant_ids::text[]) AS signal
  FROM (${LEAD_SIGNAL}) g) held ON true
ORDER BY array_position('{open,acknowledged,under-investigation,closed}', e.state), e.opened_at DESC, e.id DESC`;

const COUNTS = `
SELECT e.state, count(*)::integer AS count FROM excursion e JOIN stream s ON s.id = e.stream_id
WHERE $1::text IS NULL OR s.slug = $1 GROUP BY e.state`;

const STREAMS = `
SELECT slug, name FROM stream s WHERE EXISTS (SELECT FROM excursion e WHERE e.stream_id = s.id) ORDER BY name, id`;

/** The excursions that are asked for, those nobody has answered first and in each state the newest first. */
export async function excursionList(pool: Pool, wish: ExcursionWish): Promise<ExcursionList> {
  const [list, counted, streams] = await Promise.all([
    pool.query<ExcursionRow>(LIST, [wish.state, wish.stream, wish.most, wish.skip]),
    pool.query<{ state: ExcursionState; count: number }>(COUNTS, [wish.stream]),
    pool.query<{ slug: string; name: string }>(STREAMS),
  ]);
  const counts = { open: 0, acknowledged: 0, 'under-investigation': 0, closed: 0 };
  for (const { state, count } of counted.rows) counts[state] = count;
  return { excursions: list.rows.map(listed), counts, streams: streams.rows };
}

function listed(row: ExcursionRow): ListedExcursion {
  const { slug, name, subgroup, firstKey, firstAt, lastKey, lastAt, ...rest } = row;
  return {
    ...rest,
    stream: { slug, name, subgroup },
    first: { key: firstKey, at: firstAt },
    last: { key: lastKey, at: lastAt },
  };
}
