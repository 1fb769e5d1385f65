import type { Actor } from '@/lib/access/actor';
import type { SubgroupPoint } from '@/lib/control/limit-set';
import { getPrisma } from '@/lib/database/client';
import type { Prisma } from '@/lib/database/generated/client';
import { limitSetOf } from '@/lib/excursions/line-rows';
import type { LimitRevision } from './types';

/** Every revision of a stream's limits, newest first. */
export async function listLimitRevisions(_actor: Actor, streamId: string): Promise<LimitRevision[]> {
  const rows = await getPrisma().limitRevision.findMany({
    where: { streamId: BigInt(streamId) },
    orderBy: { revision: 'desc' },
  });
  return rows.map(limitRevisionOf);
}

/** A judged subgroup that may serve in a baseline. */
export interface BaselinePoint extends SubgroupPoint {
  id: string;
  key: string;
  at: Date;
}

/** The judged subgroups of a stream between two instants, in order. */
export async function listBaselinePoints(
  _actor: Actor,
  streamId: string,
  span: { from: Date; to: Date },
): Promise<BaselinePoint[]> {
  const rows = await getPrisma().subgroup.findMany({
    where: { streamId: BigInt(streamId), state: 'judged', positionAt: { gte: span.from, lte: span.to } },
    orderBy: [{ positionAt: 'asc' }, { key: 'asc' }],
    select: {
      id: true,
      key: true,
      positionAt: true,
      level: true,
      within: true,
      between: true,
      waferIds: true,
    },
  });
  return rows.flatMap(({ id, key, positionAt, level, within, between, waferIds }) =>
    level === null
      ? []
      : { id: id.toString(), key, at: positionAt, level, within, between, wafers: waferIds.length },
  );
}

function limitRevisionOf(row: Prisma.LimitRevisionGetPayload<object>): LimitRevision {
  return {
    id: row.id.toString(),
    revision: row.revision,
    state: row.state as LimitRevision['state'],
    origin: row.origin as LimitRevision['origin'],
    effectiveFrom: row.effectiveFrom,
    limits: limitSetOf(row),
    baselineIds: row.baselineIds.map(String),
    author: row.author,
    reason: row.reason,
    draftedAt: row.draftedAt,
    approvedBy: row.approvedBy,
    approvedAt: row.approvedAt,
    approvalReason: row.approvalReason,
  };
}
