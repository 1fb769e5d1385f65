import type { ClientBase, Pool } from 'pg';
import type { Actor } from '@/lib/access/actor';
import { getPool } from '@/lib/database/client';
import { boardStreams } from './board-streams';
import { excursionCase } from './case-record';
import { excursionList, type ExcursionWish } from './excursion-list';
import { LINE_DEPTH, type Line, type LineExcursion, type LineLimits, type LineSignal } from './line';
import {
  lineLimits,
  linePoint,
  LIMIT_SELECTION,
  POINT_SELECTION,
  type LimitRow,
  type PointRow,
  type SignalRow,
} from './line-rows';
import { measureAgainList, type MeasureAgainWish } from './measure-again-list';
import { type SpanWish, spanPoints, type StreamSpan } from './span-points';
import { type SpanWafer, type SpanWaferToMeasure, spanWafers, wafersToMeasure } from './span-wafers';
import { streamStanding, type StreamStanding } from './stream-standing';
import { type ToolWafer, toolWafers } from './tool-wafers';
import type { BoardStream, ExcursionCase, ExcursionList, MeasureAgainList } from './types';

/** Where to begin: the line holds every point from this instant on (milliseconds), and enough before it to judge. */
export interface LineWish {
  streamId: string;
  from: number;
}

/**
 * The ends of streams as judging needs them. It reads limit revisions and events in its own words: a judgement is
 * taken from one snapshot, and only from what its own query saw.
 */
export async function loadLines(
  _actor: Actor,
  client: ClientBase | Pool,
  wishes: readonly LineWish[],
): Promise<Line[]> {
  if (wishes.length === 0) return [];
  const ids = wishes.map((wish) => wish.streamId);
  const from = wishes.map(({ from: at }) =>
    at === -Infinity ? '-infinity' : at === Infinity ? 'infinity' : new Date(at).toISOString(),
  );
  const streams = await client.query<{
    id: string;
    version: string;
    subgroup_size: number;
    restarts: Date[] | null;
  }>(
    `SELECT id, version, subgroup_size,
       (SELECT array_agg(at ORDER BY at) FROM stream_event e WHERE e.stream_id = s.id AND e.restart) AS restarts
     FROM stream s WHERE id = ANY($1::bigint[])`,
    [ids],
  );
  const points = await client.query<PointRow>(
    `SELECT ${POINT_SELECTION} FROM unnest($1::bigint[], $2::timestamptz[]) AS wish (stream_id, from_at)
     CROSS JOIN LATERAL (
       (SELECT * FROM subgroup s WHERE s.stream_id = wish.stream_id AND s.position_at >= wish.from_at)
       UNION ALL
       (SELECT * FROM subgroup s WHERE s.stream_id = wish.stream_id AND s.position_at < wish.from_at
        ORDER BY position_at DESC, key DESC LIMIT ${LINE_DEPTH + 1})
     ) p ORDER BY p.stream_id, p.position_at, p.key`,
    [ids, from],
  );
  const limits = await client.query<LimitRow>(
    `SELECT ${LIMIT_SELECTION} FROM limit_revision
     WHERE stream_id = ANY($1::bigint[]) AND state IN ('provisional', 'approved') ORDER BY stream_id, revision`,
    [ids],
  );
  const excursions = await client.query<LineExcursion & { streamId: string; id: string }>(
    `SELECT stream_id AS "streamId", id, chart, side, family, first_subgroup_id AS "firstId",
       last_subgroup_id AS "lastId" FROM excursion
     WHERE stream_id = ANY($1::bigint[]) AND state <> 'closed' ORDER BY stream_id, id`,
    [ids],
  );
  const signals = await client.query<SignalRow>(
    `SELECT stream_id AS "streamId", id, chart, rule, side, first_subgroup_id AS "firstId",
       participant_ids AS "participantIds", last_subgroup_id AS "lastId", completions,
       limit_revision_id AS "limitRevisionId", excursion_id AS "excursionId", withdrawn_reason AS "withdrawnReason"
     FROM signal WHERE (stream_id, last_subgroup_id) IN (SELECT * FROM unnest($1::bigint[], $2::bigint[]))
     ORDER BY stream_id, id`,
    [points.rows.map((row) => row.streamId), points.rows.map((row) => row.id)],
  );
  const restarts = new Map(streams.rows.map((row) => [row.id, row]));
  const of = groups(points.rows);
  const limitsOf = groups(limits.rows);
  const excursionsOf = groups(excursions.rows);
  const signalsOf = groups(signals.rows);
  return wishes.flatMap(({ streamId, from: at }) => {
    const stream = restarts.get(streamId);
    if (!stream) return [];
    const revisions = (limitsOf.get(streamId) ?? []).map(lineLimits);
    const revisionOf = new Map(revisions.map((revision) => [revision.id, revision]));
    const loaded = (of.get(streamId) ?? []).map((row) => linePoint(row, revisionOf));
    const open = (excursionsOf.get(streamId) ?? []).map(openExcursion);
    return {
      streamId,
      version: stream.version,
      subgroupSize: stream.subgroup_size,
      whole: loaded.filter((point) => point.at < at).length <= LINE_DEPTH,
      points: loaded,
      limits: revisions,
      restarts: (stream.restarts ?? []).map((restart) => restart.getTime()),
      signals: (signalsOf.get(streamId) ?? []).map((row) => lineSignal(row, revisionOf, open)),
      excursions: open,
    };
  });
}

/** Every stream in use as the board shows it: its last subgroups, its limits, its cases not closed. */
export async function listBoardStreams(_actor: Actor): Promise<BoardStream[]> {
  return boardStreams(getPool());
}

/** A stretch of a stream as its charts are drawn from it. */
export async function findStreamSpan(_actor: Actor, streamId: string, wish: SpanWish): Promise<StreamSpan> {
  return spanPoints(getPool(), streamId, wish);
}

/** The wafers of some subgroups of a stream, in the order of processing. */
export async function listSpanWafers(
  _actor: Actor,
  streamId: string,
  subgroupIds: readonly string[],
): Promise<SpanWafer[]> {
  return spanWafers(getPool(), streamId, subgroupIds);
}

/** Wafers of a stretch that were recorded, not judged, and not measured again since; the newest first. */
export async function listWafersToMeasure(
  _actor: Actor,
  streamId: string,
  span: { from: Date; to: Date; most: number },
): Promise<SpanWaferToMeasure[]> {
  return wafersToMeasure(getPool(), streamId, span);
}

/** How a stream stands now: its limits, its cases not closed. */
export async function findStreamStanding(
  _actor: Actor,
  streamId: string,
  now: Date,
): Promise<StreamStanding> {
  return streamStanding(getPool(), streamId, now);
}

/** Wafers that were recorded, not judged, and not measured again since; the newest first, with how many each stream has. */
export async function listMeasureAgain(_actor: Actor, wish: MeasureAgainWish): Promise<MeasureAgainList> {
  return measureAgainList(getPool(), wish);
}

/** Excursions by what is asked for: those nobody has answered first, the newest first. */
export async function listExcursions(_actor: Actor, wish: ExcursionWish): Promise<ExcursionList> {
  return excursionList(getPool(), wish);
}

/** One excursion with its signals, its log and the subgroups about it; null when there is none of that id. */
export async function findExcursion(_actor: Actor, id: string): Promise<ExcursionCase | null> {
  return /^\d{1,18}$/.test(id) ? excursionCase(getPool(), id) : null;
}

function openExcursion(row: LineExcursion): LineExcursion {
  const { id, chart, side, family, firstId, lastId } = row;
  return { id, chart, side, family, firstId, lastId, entries: [] };
}

function lineSignal(
  row: SignalRow,
  revisionOf: ReadonlyMap<string | null, LineLimits>,
  open: readonly LineExcursion[],
): LineSignal {
  const { id, chart, rule, side, firstId, participantIds, lastId, completions } = row;
  return {
    id,
    chart,
    rule,
    side,
    firstId,
    participantIds,
    lastId,
    completions,
    limits: revisionOf.get(row.limitRevisionId) ?? null,
    excursion: open.find((excursion) => excursion.id === row.excursionId) ?? null,
    withdrawn: row.withdrawnReason,
  };
}

function groups<Row extends { streamId: string }>(rows: readonly Row[]): Map<string, Row[]> {
  const found = new Map<string, Row[]>();
  for (const row of rows) {
    const group = found.get(row.streamId);
    if (group) group.push(row);
    else found.set(row.streamId, [row]);
  }
  return found;
}

/** The last wafers of several streams, for the one scale of their tool. */
export async function listToolWafers(_actor: Actor, streamIds: readonly string[]): Promise<ToolWafer[]> {
  return toolWafers(getPool(), streamIds);
}
