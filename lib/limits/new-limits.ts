import type { ClientBase } from 'pg';
import type { Actor } from '@/lib/access/actor';
import type { Tell } from '@/lib/access/audited';
import type { LimitSet } from '@/lib/control/limit-set';
import { columnNames, rowsAsQuery } from '@/lib/database/columnar';
import { LIMIT_COLUMNS } from '@/lib/excursions/judgement-rows';
import { holdStream } from '@/lib/excursions/mutations';
import type { LimitOrigin, LimitState } from './types';

interface NewLimits {
  state: LimitState;
  origin: LimitOrigin;
  baselineIds: string[];
  at: Date;
  draftedAt?: Date;
  reason: string;
}

/** Draws limits up within a transaction, and tells of it. */
export async function draftIn(
  actor: Actor,
  client: ClientBase,
  tell: Tell,
  streamId: string,
  limits: LimitSet,
  meta: NewLimits,
): Promise<void> {
  const { id, revision } = await insertLimits(actor, client, streamId, limits, meta);
  const { centre, sigma, lower, upper } = limits.level;
  tell({
    action: 'drafted limits',
    subject: { kind: 'limit-revision', id },
    streamId,
    after: { revision, origin: meta.origin, subgroups: meta.baselineIds.length, centre, sigma, lower, upper },
    why: meta.reason,
  });
}

/** Writes the next revision of a stream's limits. */
export async function insertLimits(
  actor: Actor,
  client: ClientBase,
  streamId: string,
  limits: LimitSet,
  meta: NewLimits,
): Promise<{ id: string; revision: number }> {
  await holdStream(client, streamId);
  const { rows } = await client.query<{ next: number }>(
    'SELECT coalesce(max(revision), 0) + 1 AS next FROM limit_revision WHERE stream_id = $1',
    [streamId],
  );
  const line = {
    id: null,
    revision: rows[0]?.next ?? 1,
    effectiveFrom: meta.at.getTime(),
    supersededFrom: null,
    baselineIds: meta.baselineIds,
    limits,
  };
  const own = { id: true, state: meta.state, origin: meta.origin, reason: meta.reason };
  const columns = [
    ...LIMIT_COLUMNS.filter((column) => column.name !== 'id').map((column) =>
      column.name in own ? { ...column, value: () => own[column.name as keyof typeof own] } : column,
    ),
    { name: 'author_id', type: 'text', value: () => (actor.kind === 'person' ? actor.id : null) } as const,
  ];
  const parameters: unknown[] = [];
  const given = rowsAsQuery(
    columns,
    [{ streamId, limits: line, author: actor.name, at: meta.draftedAt ?? new Date() }],
    parameters,
  );
  const { rows: inserted } = await client.query<{ id: string }>(
    `INSERT INTO limit_revision (${columnNames(columns)}) SELECT given.* FROM ${given} given RETURNING id`,
    parameters,
  );
  return { id: inserted[0]?.id ?? '', revision: line.revision };
}
