import type { ClientBase } from 'pg';
import type { Actor } from '@/lib/access/actor';
import type { AuditAction } from '@/lib/access/audit-action';
import { audited } from '@/lib/access/audited';
import type { Permission } from '@/lib/access/permission';
import { refuse } from '@/lib/access/refusal';
import { getPool } from '@/lib/database/client';
import { loadLines } from './data';
import { judgedLine, LineTooShort } from './judged-line';
import type { Line, LinePoint } from './line';
import { type JudgedLine, pointLiterals, pointsStatement, withIds, writeFindings } from './write-judgement';

/**
 * Holds a stream until the transaction ends, so that nothing else is judged meanwhile, and moves its version on: what
 * others judged by the version before is then out of date.
 */
export async function holdStream(client: ClientBase, streamId: string): Promise<void> {
  await client.query('UPDATE stream SET version = version + 1 WHERE id = $1', [streamId]);
}

/**
 * Judges a held stream again from an instant (milliseconds) on, after something that decides the judgement has
 * changed. `amend` may change points anywhere in the stream first and returns those it touched.
 */
export async function judgeAgain(
  actor: Actor,
  client: ClientBase,
  streamId: string,
  from: number,
  why: string,
  amend: ((line: Line) => LinePoint[]) | null = null,
): Promise<void> {
  const judgedSince = async (since: number): Promise<JudgedLine[]> => {
    const [line] = await loadLines(actor, client, [{ streamId, from: since }]);
    if (line === undefined) return [];
    const touched = new Set(amend?.(line));
    const start = line.points.findIndex((point) => point.at >= from || touched.has(point));
    return start === -1 ? [] : [{ line, change: judgedLine(line, touched, start, why) }];
  };
  const judged = await judgedSince(amend === null ? from : -Infinity).catch((error: unknown) => {
    if (error instanceof LineTooShort) return judgedSince(-Infinity);
    throw error;
  });
  await withIds(getPool(), judged, client);
  if (judged.some(({ change }) => change.points.length > 0)) {
    await client.query(pointsStatement(1), pointLiterals(judged));
  }
  await writeFindings(client, judged, actor.name, new Date());
}

export type ExcursionStep =
  | { to: 'acknowledged' | 'under-investigation'; note: string }
  | { to: 'noted'; note: string }
  | { to: 'closed'; note: string; cause: string };

/** What each step is called in the log and in the audit trail, what it needs, and from which states it may be taken. */
const STEPS: Record<
  ExcursionStep['to'],
  { entry: string; action: AuditAction; permission: Permission; from: string[] }
> = {
  acknowledged: {
    entry: 'acknowledged',
    action: 'acknowledged a case',
    permission: 'acknowledge-case',
    from: ['open'],
  },
  'under-investigation': {
    entry: 'investigating',
    action: 'took up a case',
    permission: 'investigate-case',
    from: ['open', 'acknowledged'],
  },
  noted: {
    entry: 'noted',
    action: 'wrote into a case',
    permission: 'comment-case',
    from: ['open', 'acknowledged', 'under-investigation', 'closed'],
  },
  closed: {
    entry: 'closed',
    action: 'closed a case',
    permission: 'close-case',
    from: ['open', 'acknowledged', 'under-investigation'],
  },
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
  const { entry, action, permission, from } = STEPS[step.to];
  return audited(actor, async (client, tell) => {
    const { rows: ofStream } = await client.query<{ stream_id: string }>(
      'SELECT stream_id FROM excursion WHERE id = $1',
      [excursionId],
    );
    const streamId = ofStream[0]?.stream_id;
    if (streamId === undefined) return { ok: false, reason: 'There is no such excursion.' };
    const refusal = refuse(actor, permission, streamId);
    if (refusal) return refusal;
    // The stream before its excursion, as those who record wafers hold them.
    if (step.to !== 'noted') await holdStream(client, streamId);
    const { rows } = await client.query<{ state: string }>(
      'SELECT state FROM excursion WHERE id = $1 FOR UPDATE',
      [excursionId],
    );
    const state = rows[0]?.state ?? '';
    if (!from.includes(state)) {
      return { ok: false, reason: `This excursion is ${state.replaceAll('-', ' ')} already.` };
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
      [streamId, excursionId, actor.name, entry, note],
    );
    const subject = { kind: 'excursion', id: excursionId } as const;
    const states = step.to === 'noted' ? {} : { before: { state }, after: { state: step.to } };
    tell({ action, subject, streamId, ...states, ...(note === '' ? {} : { why: note }) });
    return { ok: true };
  });
}
