import type { Actor } from '@/lib/access/actor';
import type { SubgroupPoint } from '@/lib/control/limit-set';
import { getPool, getPrisma } from '@/lib/database/client';
import type { Prisma } from '@/lib/database/generated/client';
import { FIRST_BASELINE } from '@/lib/excursions/line';
import { judgesAfter, limitSetOf } from '@/lib/excursions/line-rows';
import type { ControlStatistic } from '@/lib/streams/types';
import type { LimitRevision, LimitState } from './types';

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
  const { rows } = await getPool().query<BaselinePoint>(
    `SELECT id, key, position_at AS at, level, within, between,
       cardinality(array_remove(wafer_levels, NULL)) AS wafers
     FROM subgroup WHERE stream_id = $1 AND state = 'judged' AND position_at BETWEEN $2 AND $3
     ORDER BY position_at, key`,
    [streamId, span.from, span.to],
  );
  return rows;
}

/** What judges a stream now, in brief. */
export interface LimitsInForce {
  streamId: string;
  revision: number;
  state: LimitState;
  subgroups: number;
}

/** The limits that judge each stream now; streams without any are not there. */
export async function listLimitsInForce(_actor: Actor): Promise<LimitsInForce[]> {
  const { rows } = await getPool().query<LimitsInForce>(
    `SELECT DISTINCT ON (stream_id) stream_id AS "streamId", revision, state, subgroups FROM limit_revision
     WHERE ${judgesAfter('now()')}
     ORDER BY stream_id, effective_from DESC, revision DESC`,
  );
  return rows;
}

/** How far a stream is on its way to its first limits. */
export interface FirstLevels {
  /** Judged subgroups, counted up to the 25 that make first limits. */
  judged: number;
  /** Their levels are all equal: then no limits come of them. */
  alike: boolean;
}

export async function findFirstLevels(_actor: Actor, streamId: string): Promise<FirstLevels> {
  const { rows } = await getPool().query<FirstLevels>(
    `SELECT count(*)::integer AS judged, coalesce(max(level) - min(level) <= 1e-12 * abs(min(level)), false) AS alike
     FROM (SELECT level FROM subgroup WHERE stream_id = $1 AND state = 'judged'
       ORDER BY position_at, key LIMIT ${FIRST_BASELINE}) begun`,
    [streamId],
  );
  return rows[0] ?? { judged: 0, alike: false };
}

/** The span of a stream's latest judged subgroups, at most so many; null while there are fewer than two. */
export async function findLatestSpan(
  _actor: Actor,
  streamId: string,
  most: number,
): Promise<{ from: Date; to: Date } | null> {
  const { rows } = await getPool().query<{ from: Date | null; to: Date | null; count: number }>(
    `SELECT min(position_at) AS "from", max(position_at) AS "to", count(*)::integer AS count FROM
       (SELECT position_at FROM subgroup WHERE stream_id = $1 AND state = 'judged'
        ORDER BY position_at DESC, key DESC LIMIT $2) latest`,
    [streamId, most],
  );
  const { from = null, to = null, count = 0 } = rows[0] ?? {};
  return from === null || to === null || count < 2 ? null : { from, to };
}

/** A judged wafer that may serve in a calibration: its control statistic, and what it brings to its expected value. */
export interface CalibrationWafer {
  subgroupId: string;
  measured: number;
  ingotFraction: number | null;
  thicknessUm: number | null;
}

const STATISTIC_COLUMN: Record<ControlStatistic, string> = {
  areaMean: 'area_mean',
  mean: 'mean',
  median: 'median',
};

/** The judged wafers of a stream whose subgroups lie between two instants, in order. */
export async function listCalibrationWafers(
  _actor: Actor,
  streamId: string,
  statistic: ControlStatistic,
  span: { from: Date; to: Date },
): Promise<CalibrationWafer[]> {
  const { rows } = await getPool().query<CalibrationWafer>(
    `SELECT w.subgroup_id AS "subgroupId", w.${STATISTIC_COLUMN[statistic]} AS measured,
       w.ingot_fraction AS "ingotFraction", w.thickness_um AS "thicknessUm"
     FROM subgroup s JOIN wafer_measurement w ON w.stream_id = s.stream_id AND w.subgroup_id = s.id
     WHERE s.stream_id = $1 AND s.state = 'judged' AND s.position_at BETWEEN $2 AND $3
       AND w.level IS NOT NULL AND w.${STATISTIC_COLUMN[statistic]} > 0
     ORDER BY s.position_at, s.key, w.id`,
    [streamId, span.from, span.to],
  );
  return rows;
}

function limitRevisionOf(row: Prisma.LimitRevisionGetPayload<object>): LimitRevision {
  return {
    id: row.id.toString(),
    revision: row.revision,
    state: row.state as LimitRevision['state'],
    origin: row.origin as LimitRevision['origin'],
    effectiveFrom: row.effectiveFrom,
    supersededFrom: row.supersededFrom,
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
