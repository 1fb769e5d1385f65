import type { ClientBase } from 'pg';
import type { Actor } from '@/lib/access/actor';
import { audited } from '@/lib/access/audited';
import { refuse } from '@/lib/access/refusal';
import { holdStream, judgeAgain } from '@/lib/excursions/mutations';
import type { Target } from '@/lib/physics/target';
import { newestProcessedAt } from './newest-processed-at';
import { insertSpecification, insertTarget, specificationFacts, targetFacts } from './revision-rows';
import type { Result, Specification, StreamEvent } from './types';

export { createSitePlan, createStream, type NewStream } from './create-stream';

/**
 * A new revision of the target, in force for wafers processed from `effectiveFrom` on, which lies after those on
 * record. With `restart` the rules begin afresh there. Returns the revision's number.
 */
export async function reviseTarget(
  actor: Actor,
  streamId: string,
  target: Target,
  meta: { effectiveFrom: Date; reason: string; calibrationWafers?: number | null; restart?: boolean },
): Promise<Result<number>> {
  const refusal = refuse(actor, 'revise-target', streamId);
  if (refusal) return refusal;
  return audited(actor, async (client, tell) => {
    await holdStream(client, streamId);
    if (await isBeforeRecorded(client, streamId, meta.effectiveFrom)) return BEFORE_RECORDED;
    const { id, revision, before } = await insertTarget(actor, client, streamId, target, meta);
    tell({
      action: 'revised a target',
      subject: { kind: 'target-revision', id },
      streamId,
      ...(before === null ? {} : { before }),
      after: {
        revision,
        ...targetFacts(target),
        effectiveFrom: meta.effectiveFrom.toISOString(),
        restart: meta.restart === true,
      },
      why: meta.reason,
    });
    if (meta.restart === true) {
      const text = `target revision ${revision}: ${meta.reason}`;
      const event = { kind: 'adjustment', at: meta.effectiveFrom, restart: true, text } as const;
      await recordEvent(actor, client, streamId, event);
    }
    return { ok: true, value: revision };
  });
}

const DONE = { ok: true, value: undefined } as const;

const BEFORE_RECORDED = {
  ok: false,
  reason: 'Wafers processed later are on record, and stay as they were judged: choose a time after them.',
} as const;

async function isBeforeRecorded(client: ClientBase, streamId: string, at: Date): Promise<boolean> {
  const newest = await newestProcessedAt(client, streamId);
  return newest !== null && newest >= at;
}

/** A new revision of the specification, in force for wafers processed from `effectiveFrom` on, after those on record. */
export async function reviseSpecification(
  actor: Actor,
  streamId: string,
  specification: Specification,
  meta: { effectiveFrom: Date; reason: string },
): Promise<Result<number>> {
  const refusal = refuse(actor, 'revise-specification', streamId);
  if (refusal) return refusal;
  return audited(actor, async (client, tell) => {
    await holdStream(client, streamId);
    if (await isBeforeRecorded(client, streamId, meta.effectiveFrom)) return BEFORE_RECORDED;
    const { id, revision, before } = await insertSpecification(actor, client, streamId, specification, meta);
    tell({
      action: 'revised a specification',
      subject: { kind: 'specification-revision', id },
      streamId,
      ...(before === null ? {} : { before }),
      after: {
        revision,
        ...specificationFacts(specification),
        effectiveFrom: meta.effectiveFrom.toISOString(),
      },
      why: meta.reason,
    });
    return { ok: true, value: revision };
  });
}

/** Records an adjustment or maintenance. One marked `restart` parts the stream: what lies after it is judged again. */
export async function recordStreamEvent(
  actor: Actor,
  streamId: string,
  event: Pick<StreamEvent, 'kind' | 'at' | 'restart' | 'text'>,
): Promise<Result> {
  const refusal = refuse(actor, 'record-event', streamId);
  if (refusal) return refusal;
  return audited(actor, async (client, tell) => {
    const { kind, at, restart, text } = event;
    const id = await recordEvent(actor, client, streamId, event);
    const subject = { kind: 'event', id } as const;
    const after = { name: kind, at: at.toISOString(), restart };
    tell({ action: 'recorded an event', subject, streamId, after, why: text });
    return DONE;
  });
}

async function recordEvent(
  actor: Actor,
  client: ClientBase,
  streamId: string,
  event: Pick<StreamEvent, 'kind' | 'at' | 'restart' | 'text'>,
): Promise<string> {
  await holdStream(client, streamId);
  const { rows } = await client.query<{ id: string }>(
    'INSERT INTO stream_event (stream_id, kind, at, restart, text, actor) VALUES ($1, $2, $3, $4, $5, $6) RETURNING id',
    [streamId, event.kind, event.at, event.restart, event.text, actor.name],
  );
  if (event.restart) {
    await judgeAgain(actor, client, streamId, event.at.getTime(), `a restart was recorded: ${event.text}`);
  }
  return rows[0]?.id ?? '';
}

/** Takes a stream out of use, or back into use; its wafers and charts stay. */
export async function retireStream(actor: Actor, streamId: string, retired: boolean): Promise<Result> {
  const refusal = refuse(actor, 'retire-stream', streamId);
  if (refusal) return refusal;
  return audited(actor, async (client, tell) => {
    const { rowCount } = await client.query(
      `UPDATE stream SET retired_at = CASE WHEN $2::boolean THEN now() END,
         retired_by = CASE WHEN $2::boolean THEN $3::text END
       WHERE id = $1`,
      [streamId, retired, actor.name],
    );
    if (rowCount !== 1) return { ok: false, reason: 'There is no such stream.' };
    const action = retired ? 'retired a stream' : 'took a stream up again';
    tell({ action, subject: { kind: 'stream', id: streamId }, streamId });
    return DONE;
  });
}
