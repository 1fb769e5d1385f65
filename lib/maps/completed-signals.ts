import type { Pool } from 'pg';
import type { CompletedSignal, WaferRecord } from './wafer-record';

type Row = Omit<CompletedSignal, 'excursion'> & { excursionId: string | null; excursionState: string | null };

const STATEMENT = `
SELECT g.id, g.chart, g.rule, g.side, g.participant_ids AS "participantIds", g.completions,
  e.id AS "excursionId", e.state AS "excursionState"
FROM signal g
JOIN subgroup first ON first.stream_id = g.stream_id AND first.id = g.first_subgroup_id
JOIN subgroup last ON last.stream_id = g.stream_id AND last.id = g.last_subgroup_id
LEFT JOIN excursion e ON e.stream_id = g.stream_id AND e.id = g.excursion_id
WHERE g.stream_id = $1 AND g.withdrawn_at IS NULL AND concat_ws(':', g.chart, g.rule, g.side) = ANY($2)
  AND (first.position_at, first.key) <= ($3, $4) AND (last.position_at, last.key) >= ($3, $4)
ORDER BY g.chart = 'specification' DESC, g.id`;

/** The signals that a wafer's subgroup completes or carries on, with their cases; the wafer's own way out of specification too. */
export async function readCompletedSignals(pool: Pool, wafer: WaferRecord): Promise<CompletedSignal[]> {
  const { streamId, subgroup, specification } = wafer;
  const names = [...subgroup.completions, ...specification.map((fault) => `specification:${fault}`)];
  if (names.length === 0) return [];
  const parameters = [streamId, names, subgroup.positionAt, subgroup.key];
  const { rows } = await pool.query<Row>(STATEMENT, parameters);
  return rows.map(({ excursionId, excursionState, ...signal }) => ({
    ...signal,
    excursion: excursionId === null ? null : { id: excursionId, state: excursionState ?? 'open' },
  }));
}
