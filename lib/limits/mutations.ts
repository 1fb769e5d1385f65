import type { Actor } from '@/lib/access/actor';
import { audited } from '@/lib/access/audited';
import { isFourEyes } from '@/lib/access/four-eyes';
import { refuse } from '@/lib/access/refusal';
import { hasRoom } from '@/lib/control/has-room';
import { limitSet, type LimitSet } from '@/lib/control/limit-set';
import { holdStream, judgeAgain } from '@/lib/excursions/mutations';
import { newestProcessedAt } from '@/lib/streams/newest-processed-at';
import type { Screen } from '@/lib/wafer/measure-wafer';
import { listBaselinePoints } from './data';
import { draftIn, insertLimits } from './new-limits';
import { remeasuredBaseline } from './remeasured-baseline';
import type { LimitState } from './types';

export type Result = { ok: true } | { ok: false; reason: string };

/** Draws up limits from the judged subgroups of a span; they judge nothing until approved. */
export async function draftLimits(
  actor: Actor,
  streamId: string,
  span: { from: Date; to: Date },
  reason: string,
  draftedAt = new Date(),
): Promise<Result> {
  const refusal = refuse(actor, 'draft-limits', streamId);
  if (refusal) return refusal;
  const points = await listBaselinePoints(actor, streamId, span);
  if (points.length < 2)
    return { ok: false, reason: `That span holds ${points.length} judged subgroups; limits need two.` };
  const limits = limitSet(points);
  if (!hasRoom(limits))
    return { ok: false, reason: 'All levels of that span are equal: no limits come of it.' };
  const baselineIds = points.map((point) => point.id);
  await audited(actor, (client, tell) =>
    draftIn(actor, client, tell, streamId, limits, {
      state: 'draft',
      origin: 'chosen-span',
      baselineIds,
      at: draftedAt,
      draftedAt,
      reason,
    }),
  );
  return { ok: true };
}

/** Enters limits that were in use elsewhere before. They are in force from the instant given once approved. */
export async function enterInheritedLimits(
  actor: Actor,
  streamId: string,
  limits: LimitSet,
  effectiveFrom: Date,
  reason: string,
): Promise<Result> {
  const refusal = refuse(actor, 'draft-limits', streamId);
  if (refusal) return refusal;
  await audited(actor, (client, tell) =>
    draftIn(actor, client, tell, streamId, limits, {
      state: 'draft',
      origin: 'inherited',
      baselineIds: [],
      at: effectiveFrom,
      reason,
    }),
  );
  return { ok: true };
}

/**
 * Approves a draft or provisional limits. A draft takes force at `effectiveFrom`, provisional ones go on as they were;
 * from then on no other provisional revision judges, but one that a later change of the screening began, and what lies
 * later is judged again. Approved limits are never edited. Where four eyes are asked for, whoever drew limits up does not approve them.
 */
export async function approveLimits(
  actor: Actor,
  revisionId: string,
  approval: { reason: string; effectiveFrom: Date; at?: Date },
): Promise<Result> {
  return audited(actor, async (client, tell) => {
    const { rows } = await client.query<{
      stream_id: string;
      state: LimitState;
      revision: number;
      effective_from: Date;
      author_id: string | null;
      is_superseded: boolean;
    }>(
      `SELECT stream_id, state, revision, effective_from, author_id, superseded_from IS NOT NULL AS is_superseded
       FROM limit_revision WHERE id = $1 FOR UPDATE`,
      [revisionId],
    );
    const found = rows[0];
    if (found === undefined) return { ok: false, reason: 'There is no such revision.' };
    const refusal = refuse(actor, 'approve-limits', found.stream_id);
    if (refusal) return refusal;
    if (found.author_id !== null && found.author_id === actor.id && (await isFourEyes(actor, client))) {
      return { ok: false, reason: 'You drew these limits up: someone else approves them.' };
    }
    if (found.state !== 'draft' && found.state !== 'provisional') {
      return { ok: false, reason: `Revision ${found.revision} is ${found.state} already.` };
    }
    if (found.is_superseded) {
      return {
        ok: false,
        reason: `Another revision was approved since: revision ${found.revision} gave way to it.`,
      };
    }
    await holdStream(client, found.stream_id);
    const effectiveFrom = found.state === 'draft' ? approval.effectiveFrom : found.effective_from;
    await client.query(
      `UPDATE limit_revision SET state = 'approved', approved_by = $2, approved_at = $5, approval_reason = $3,
         effective_from = $4 WHERE id = $1`,
      [revisionId, actor.name, approval.reason, effectiveFrom, approval.at ?? new Date()],
    );
    const { rowCount: superseded } = await client.query(
      `UPDATE limit_revision SET superseded_from = least(superseded_from, $2)
       WHERE stream_id = $1 AND state = 'provisional' AND (origin <> 'screening' OR effective_from <= $2)`,
      [found.stream_id, effectiveFrom],
    );
    tell({
      action: 'approved limits',
      subject: { kind: 'limit-revision', id: revisionId },
      streamId: found.stream_id,
      before: { state: found.state },
      after: { revision: found.revision, state: 'approved', effectiveFrom: effectiveFrom.toISOString() },
      why: approval.reason,
    });
    if (found.state === 'draft' || superseded !== 0) {
      const why = `limit revision ${found.revision} took force`;
      await judgeAgain(actor, client, found.stream_id, effectiveFrom.getTime(), why);
    }
    return { ok: true };
  });
}

/** Sets a draft aside. It stays on record. */
export async function discardLimits(actor: Actor, revisionId: string): Promise<Result> {
  return audited(actor, async (client, tell) => {
    const { rows } = await client.query<{ stream_id: string; revision: number }>(
      "SELECT stream_id, revision FROM limit_revision WHERE id = $1 AND state = 'draft' FOR UPDATE",
      [revisionId],
    );
    const [found] = rows;
    if (found === undefined) return { ok: false, reason: 'Only a draft can be set aside.' };
    const refusal = refuse(actor, 'draft-limits', found.stream_id);
    if (refusal) return refusal;
    await client.query("UPDATE limit_revision SET state = 'discarded' WHERE id = $1", [revisionId]);
    tell({
      action: 'set limits aside',
      subject: { kind: 'limit-revision', id: revisionId },
      streamId: found.stream_id,
      before: { state: 'draft' },
      after: { revision: found.revision, state: 'discarded' },
    });
    return { ok: true };
  });
}

/**
 * Changes how a stream's readings are screened: of wafers processed from now on, and after those on record. Limits
 * drawn from readings screened otherwise no longer fit, so the baseline of those in force is measured again and a new
 * provisional revision begins at the same instant.
 */
export async function changeScreening(
  actor: Actor,
  streamId: string,
  screening: Screen,
  reason: string,
): Promise<Result> {
  const refusal = refuse(actor, 'change-rules', streamId);
  if (refusal) return refusal;
  return audited(actor, async (client, tell) => {
    await holdStream(client, streamId);
    const { rows } = await client.query<{ screening: Screen }>('SELECT screening FROM stream WHERE id = $1', [
      streamId,
    ]);
    const before = rows[0]?.screening;
    if (before === undefined) return { ok: false, reason: 'There is no such stream.' };
    if (before === screening) return { ok: false, reason: 'Readings are screened so already.' };
    const points = await remeasuredBaseline(actor, client, streamId, screening);
    if (points !== null && points.length < 2)
      return { ok: false, reason: 'The baseline in force leaves too few wafers under that screening.' };
    const limits = points === null ? null : limitSet(points);
    if (limits !== null && !hasRoom(limits))
      return { ok: false, reason: 'Under that screening all levels of the baseline are equal.' };
    const newest = await newestProcessedAt(client, streamId);
    const at = new Date(Math.max(Date.now(), newest?.getTime() ?? 0));
    await client.query('UPDATE stream SET screening = $2 WHERE id = $1', [streamId, screening]);
    await client.query(
      'INSERT INTO screening_change (stream_id, at, former, screening, author, reason) VALUES ($1, $2, $3, $4, $5, $6)',
      [streamId, at, before, screening, actor.name, reason],
    );
    tell({
      action: 'changed the screening',
      subject: { kind: 'stream', id: streamId },
      streamId,
      before: { screening: before },
      after: { screening, at: at.toISOString() },
      why: reason,
    });
    if (points === null || limits === null) return { ok: true };
    await insertLimits(actor, client, streamId, limits, {
      state: 'provisional',
      origin: 'screening',
      baselineIds: points.map((point) => point.id),
      at,
      reason: `screening changed from ${before} to ${screening}: ${reason}`,
    });
    return { ok: true };
  });
}
