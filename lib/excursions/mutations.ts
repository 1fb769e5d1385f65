import type { ClientBase } from 'pg';
import type { Actor } from '@/lib/access/actor';
import { getPool } from '@/lib/database/client';
import { inTransaction } from '@/lib/database/transaction';
import { loadLines } from './data';
import { judgedLine } from './judged-line';
import type { Line, LinePoint } from './line';
import { pointLiterals, pointsStatement, withIds, writeFindings } from './write-judgement';

/**
 * Holds a stream until the transaction ends, so that nothing else is judged meanwhile, and moves its version on: what
 * others judged by the version before is then out of date.
 */
export async function holdStream(client: ClientBase, streamId: string): Promise<void> {
  await client.query('UPDATE stream SET version = version + 1 WHERE id = $1', [streamId]);
}

/**
 * Judges a held stream again from an instant (milliseconds) on, after something that decides the judgement has
 * changed. `amend` may change points of the loaded line first and returns those it touched.
 */
export async function judgeAgain(
  actor: Actor,
  client: ClientBase,
  streamId: string,
  from: number,
  why: string,
  amend: (line: Line) => LinePoint[] = () => [],
): Promise<void> {
  const [line] = await loadLines(actor, client, [{ streamId, from: -Infinity }]);
  if (line === undefined) return;
  const touched = new Set(amend(line));
  const start = line.points.findIndex((point) => point.at >= from || touched.has(point));
  if (start === -1) return;
  const change = judgedLine(line, touched, start, why);
  const judged = [{ line, change }];
  await withIds(getPool(), judged, client);
  if (change.points.length > 0) await client.query(pointsStatement(1), pointLiterals(judged));
  await writeFindings(client, judged, actor.name, new Date());
}

export type ExcursionStep =
  | { to: 'acknowledged' | 'under-investigation'; note: string }
  | { to: 'noted'; note: string }
  | { to: 'closed'; note: string; cause: string };

const ENTRY_OF = {
  acknowledged: 'acknowledged',
  'under-investigation': 'investigating',
  noted: 'noted',
  closed: 'closed',
} as const;

/** From which states a step may be taken. */
const ALLOWED_FROM: Record<ExcursionStep['to'], string[]> = {
  acknowledged: ['open'],
  'under-investigation': ['open', 'acknowledged'],
  noted: ['open', 'acknowledged', 'under-investigation', 'closed'],
  closed: ['open', 'acknowledged', 'under-investigation'],
};

/**
 * Takes an excursion a step further and writes who did it into its log. A case never goes back: where someone else
 * was quicker, nothing changes and the answer says so.
 */
export async function stepExcursion(
  actor: Actor,
  excursionId: string,
  step: ExcursionStep,
): Promise<{ ok: true } | { ok: false; reason: string }> {
  return inTransaction(async (client) => {
    // The stream before its excursion, as those who record wafers hold them.
    if (step.to !== 'noted') {
      const { rows } = await client.query<{ stream_id: string }>(
        'SELECT stream_id FROM excursion WHERE id = $1',
        [excursionId],
      );
      if (rows[0] !== undefined) await holdStream(client, rows[0].stream_id);
    }
    const { rows } = await client.query<{ stream_id: string; state: string }>(
      'SELECT stream_id, state FROM excursion WHERE id = $1 FOR UPDATE',
      [excursionId],
    );
    const found = rows[0];
    if (found === undefined) return { ok: false, reason: 'There is no such excursion.' };
    if (!ALLOWED_FROM[step.to].includes(found.state)) {
      return { ok: false, reason: `This excursion is ${found.state.replaceAll('-', ' ')} already.` };
    }
    if (step.to !== 'noted') {
      await client.query(
        `UPDATE excursion SET state = $2::text,
           acknowledged_at = coalesce(acknowledged_at, now()), acknowledged_by = coalesce(acknowledged_by, $3::text),
           closed_at = CASE WHEN $2::text = 'closed' THEN now() END,
           closed_by = CASE WHEN $2::text = 'closed' THEN $3::text END, cause = $4::text
         WHERE id = $1`,
        [excursionId, step.to, actor.name, step.to === 'closed' ? step.cause : null],
      );
    }
    const note =
      step.to === 'closed' ? [step.cause, step.note].filter((text) => text !== '').join('. ') : step.note;
    await client.query(
      'INSERT INTO excursion_entry (stream_id, excursion_id, actor, action, note) VALUES ($1, $2, $3, $4, $5)',
      [found.stream_id, excursionId, actor.name, ENTRY_OF[step.to], note],
    );
    return { ok: true };
  });
}
