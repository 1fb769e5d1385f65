import type { LimitSet } from '@/lib/control/limit-set';
import { arrayLiteral, type Column } from '@/lib/database/columnar';
import type { LineLimits, LinePoint } from './line';

/** A subgroup as the database gives it. */
export interface PointRow {
  streamId: string;
  id: string;
  key: string;
  positionAt: Date;
  state: LinePoint['state'];
  history: boolean;
  waferIds: string[];
  waferLevels: (number | null)[];
  waferWithins: (number | null)[];
  level: number | null;
  within: number | null;
  between: number | null;
  movingRange: number | null;
  limitRevisionId: string | null;
  completions: string[];
  specification: string[];
}

export const POINT_SELECTION = `p.stream_id AS "streamId", p.id, p.key, p.position_at AS "positionAt", p.state, p.history,
  p.wafer_ids AS "waferIds", p.wafer_levels AS "waferLevels", p.wafer_withins AS "waferWithins", p.level, p.within,
  p.between, p.moving_range AS "movingRange", p.limit_revision_id AS "limitRevisionId", p.completions, p.specification`;

export interface SignalRow {
  streamId: string;
  id: string;
  chart: string;
  rule: string;
  side: 'above' | 'below';
  firstId: string;
  participantIds: string[];
  lastId: string;
  completions: number;
  limitRevisionId: string | null;
  excursionId: string | null;
  withdrawnReason: string | null;
}

export interface LimitRow {
  streamId: string;
  id: string;
  revision: number;
  effectiveFrom: Date;
  supersededFrom: Date | null;
  baselineIds: string[];
  subgroups: number;
  centre: number;
  sigma: number;
  lower: number;
  upper: number;
  movingRangeCentre: number;
  movingRangeUpper: number;
  withinLogMean: number | null;
  withinLogSigma: number | null;
  withinLower: number | null;
  withinCentre: number | null;
  withinUpper: number | null;
  betweenCentre: number | null;
  betweenUpper: number | null;
  betweenWafers: number | null;
}

export const LIMIT_SELECTION = `stream_id AS "streamId", id, revision, effective_from AS "effectiveFrom",
  superseded_from AS "supersededFrom", baseline_ids AS "baselineIds", subgroups, centre, sigma, lower, upper, moving_range_centre AS "movingRangeCentre",
  moving_range_upper AS "movingRangeUpper", within_log_mean AS "withinLogMean", within_log_sigma AS "withinLogSigma",
  within_lower AS "withinLower", within_centre AS "withinCentre", within_upper AS "withinUpper",
  between_centre AS "betweenCentre", between_upper AS "betweenUpper", between_wafers AS "betweenWafers"`;

/** A row of `limit_revision` that judges what is processed just after an instant, as `limitsInForce` has it. */
export const judgesAfter = (at: string) => `state IN ('provisional', 'approved') AND effective_from <= ${at}
  AND (superseded_from IS NULL OR superseded_from > ${at})`;

/** The limits of one revision, as the charts know them. */
export function limitSetOf(
  row: Omit<LimitRow, 'streamId' | 'id' | 'revision' | 'effectiveFrom' | 'supersededFrom' | 'baselineIds'>,
): LimitSet {
  const {
    withinLower,
    withinUpper,
    withinCentre,
    withinLogMean,
    withinLogSigma,
    betweenCentre,
    betweenUpper,
  } = row;
  return {
    n: row.subgroups,
    level: { centre: row.centre, sigma: row.sigma, lower: row.lower, upper: row.upper },
    movingRange: { centre: row.movingRangeCentre, upper: row.movingRangeUpper },
    within:
      withinLower === null || withinUpper === null
        ? null
        : {
            logMean: withinLogMean ?? 0,
            logSigma: withinLogSigma ?? 0,
            lower: withinLower,
            centre: withinCentre ?? withinLower,
            upper: withinUpper,
          },
    between:
      betweenCentre === null || betweenUpper === null
        ? null
        : {
            centre: betweenCentre,
            upper: betweenUpper,
            ...(row.betweenWafers === null ? {} : { wafers: row.betweenWafers }),
          },
  };
}

export function lineLimits(row: LimitRow): LineLimits {
  return {
    id: row.id,
    revision: row.revision,
    effectiveFrom: row.effectiveFrom.getTime(),
    supersededFrom: row.supersededFrom?.getTime() ?? null,
    baselineIds: row.baselineIds,
    limits: limitSetOf(row),
  };
}

export function linePoint(row: PointRow, limits: ReadonlyMap<string | null, LineLimits>): LinePoint {
  return {
    id: row.id,
    key: row.key,
    at: row.positionAt.getTime(),
    history: row.history,
    members: row.waferIds.map((waferId, i) => ({
      waferId,
      level: row.waferLevels[i] ?? null,
      within: row.waferWithins[i] ?? null,
    })),
    state: row.state,
    level: row.level,
    within: row.within,
    between: row.between,
    movingRange: row.movingRange,
    limits: limits.get(row.limitRevisionId) ?? null,
    completions: row.completions,
    specification: row.specification,
  };
}

/** How a point of a stream is written. */
export const POINT_COLUMNS: readonly Column<{ streamId: string; point: LinePoint }>[] = [
  { name: 'stream_id', type: 'bigint', value: (row) => row.streamId },
  { name: 'id', type: 'bigint', value: (row) => row.point.id },
  { name: 'key', type: 'text', value: (row) => row.point.key },
  { name: 'position_at', type: 'timestamptz', value: (row) => new Date(row.point.at) },
  { name: 'state', type: 'text', value: (row) => row.point.state },
  { name: 'history', type: 'boolean', value: (row) => row.point.history },
  {
    name: 'wafer_ids',
    type: 'bigint[]',
    value: (row) => arrayLiteral(row.point.members.map((m) => m.waferId)),
  },
  {
    name: 'wafer_levels',
    type: 'float8[]',
    value: (row) => arrayLiteral(row.point.members.map((m) => m.level)),
  },
  {
    name: 'wafer_withins',
    type: 'float8[]',
    value: (row) => arrayLiteral(row.point.members.map((m) => m.within)),
  },
  { name: 'level', type: 'float8', value: (row) => row.point.level },
  { name: 'within', type: 'float8', value: (row) => row.point.within },
  { name: 'between', type: 'float8', value: (row) => row.point.between },
  { name: 'moving_range', type: 'float8', value: (row) => row.point.movingRange },
  { name: 'limit_revision_id', type: 'bigint', value: (row) => row.point.limits?.id ?? null },
  { name: 'completions', type: 'text[]', value: (row) => arrayLiteral(row.point.completions) },
  { name: 'specification', type: 'text[]', value: (row) => arrayLiteral(row.point.specification) },
];
