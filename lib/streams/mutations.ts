import type { ClientBase } from 'pg';
import type { Actor } from '@/lib/access/actor';
import { refuse } from '@/lib/access/refusal';
import { getPrisma } from '@/lib/database/client';
import { inTransaction } from '@/lib/database/transaction';
import { holdStream, judgeAgain } from '@/lib/excursions/mutations';
import type { Target } from '@/lib/physics/target';
import { newestProcessedAt } from './newest-processed-at';
import type { SitePlan, Specification, Stream, StreamEvent } from './types';

export type Result<Value = undefined> = { ok: true; value: Value } | { ok: false; reason: string };

/** From the beginning: the first revision of a target or specification holds for old wafers too. */
const BEGINNING = new Date(0);

/** Creates a site plan. */
export async function createSitePlan(actor: Actor, plan: Omit<SitePlan, 'id'>): Promise<Result<string>> {
  const refusal = refuse(actor, 'create-stream');
  if (refusal) return refusal;
  const { name, diameterMm, edgeExclusionMm, orientation, sites } = plan;
  const row = await createdUnlessTaken(
    getPrisma().sitePlan.create({
      data: {
        name,
        diameterMm,
        edgeExclusionMm,
        orientation,
        xMm: sites.map((site) => site.xMm),
        yMm: sites.map((site) => site.yMm),
        createdBy: actor.name,
      },
    }),
  );
  if (row === null) return { ok: false, reason: `There is a site plan "${name}" already.` };
  return { ok: true, value: row.id.toString() };
}

export type NewStream = Omit<Stream, 'id' | 'plan' | 'retiredAt'> & { sitePlanId: string };

/** Creates a stream with its first target and specification, all in force from the beginning. */
export async function createStream(
  actor: Actor,
  stream: NewStream,
  target: Target | null,
  specification: Specification | null,
): Promise<Result<string>> {
  const refusal = refuse(actor, 'create-stream');
  if (refusal) return refusal;
  const { sitePlanId, ...fields } = stream;
  const first = { revision: 1, effectiveFrom: BEGINNING, author: actor.name, reason: 'first of the stream' };
  const row = await createdUnlessTaken(
    getPrisma().stream.create({
      data: {
        ...fields,
        sitePlanId: BigInt(sitePlanId),
        createdBy: actor.name,
        ...(target === null ? {} : { targets: { create: [{ ...first, ...targetFields(target) }] } }),
        ...(specification === null ? {} : { specifications: { create: [{ ...first, ...specification }] } }),
      },
    }),
  );
  if (row === null) return { ok: false, reason: `There is a stream "${stream.slug}" already.` };
  return { ok: true, value: row.id.toString() };
}

/** What was created; null where its name was taken already, by another at the same time perhaps. */
async function createdUnlessTaken<Row>(creation: Promise<Row>): Promise<Row | null> {
  try {
    return await creation;
  } catch (error) {
    // Prisma's word for a broken unique constraint.
    if (error instanceof Error && 'code' in error && error.code === 'P2002') return null;
    throw error;
  }
}

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
  return inTransaction(async (client) => {
    await holdStream(client, streamId);
    if (await isBeforeRecorded(client, streamId, meta.effectiveFrom)) return BEFORE_RECORDED;
    const t = targetFields(target);
    const { rows } = await client.query<{ revision: number }>(
      `INSERT INTO target_revision (stream_id, revision, effective_from, dopant, density_per_cm3, tolerance_percent,
         along_crystal, profile, length_um, background_dopant, background_density_per_cm3, calibration_factor,
         calibration_percent, calibration_wafers, author, reason)
       VALUES ($1, ${nextRevision('target_revision')}, $2, $3, $4, $5, $6, $7, $8, $9, $10, $11, $12, $13, $14, $15)
       RETURNING revision`,
      [
        streamId,
        meta.effectiveFrom,
        t.dopant,
        t.densityPerCm3,
        t.tolerancePercent,
        t.alongCrystal,
        t.profile,
        t.lengthUm,
        t.backgroundDopant,
        t.backgroundDensityPerCm3,
        t.calibrationFactor,
        t.calibrationPercent,
        meta.calibrationWafers ?? null,
        actor.name,
        meta.reason,
      ],
    );
    const revision = rows[0]?.revision ?? 1;
    if (meta.restart === true) {
      const text = `target revision ${revision}: ${meta.reason}`;
      const event = { kind: 'adjustment', at: meta.effectiveFrom, restart: true, text } as const;
      await recordStreamEventIn(actor, client, streamId, event);
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
  s: Specification,
  meta: { effectiveFrom: Date; reason: string },
): Promise<Result<number>> {
  const refusal = refuse(actor, 'revise-specification', streamId);
  if (refusal) return refusal;
  return inTransaction(async (client) => {
    await holdStream(client, streamId);
    if (await isBeforeRecorded(client, streamId, meta.effectiveFrom)) return BEFORE_RECORDED;
    const { rows } = await client.query<{ revision: number }>(
      `INSERT INTO specification_revision (stream_id, revision, effective_from, mean_lower, mean_upper, site_lower,
         site_upper, nonuniformity_metric, nonuniformity_upper, author, reason)
       VALUES ($1, ${nextRevision('specification_revision')}, $2, $3, $4, $5, $6, $7, $8, $9, $10)
       RETURNING revision`,
      [
        streamId,
        meta.effectiveFrom,
        s.meanLower,
        s.meanUpper,
        s.siteLower,
        s.siteUpper,
        s.nonuniformityMetric,
        s.nonuniformityUpper,
        actor.name,
        meta.reason,
      ],
    );
    return { ok: true, value: rows[0]?.revision ?? 1 };
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
  await inTransaction((client) => recordStreamEventIn(actor, client, streamId, event));
  return DONE;
}

async function recordStreamEventIn(
  actor: Actor,
  client: ClientBase,
  streamId: string,
  event: Pick<StreamEvent, 'kind' | 'at' | 'restart' | 'text'>,
): Promise<void> {
  await holdStream(client, streamId);
  await client.query(
    'INSERT INTO stream_event (stream_id, kind, at, restart, text, actor) VALUES ($1, $2, $3, $4, $5, $6)',
    [streamId, event.kind, event.at, event.restart, event.text, actor.name],
  );
  if (event.restart) {
    await judgeAgain(actor, client, streamId, event.at.getTime(), `a restart was recorded: ${event.text}`);
  }
}

/** Takes a stream out of use, or back into use; its wafers and charts stay. */
export async function retireStream(actor: Actor, streamId: string, retired: boolean): Promise<Result> {
  const refusal = refuse(actor, 'retire-stream', streamId);
  if (refusal) return refusal;
  await getPrisma().stream.update({
    where: { id: BigInt(streamId) },
    data: retired ? { retiredAt: new Date(), retiredBy: actor.name } : { retiredAt: null, retiredBy: null },
  });
  return DONE;
}

function nextRevision(table: string): string {
  return `(SELECT coalesce(max(revision), 0) + 1 FROM ${table} WHERE stream_id = $1)`;
}

function targetFields(target: Target): Omit<Target, 'quantity'> {
  const { dopant, densityPerCm3, tolerancePercent, alongCrystal, profile, lengthUm } = target;
  const { backgroundDopant, backgroundDensityPerCm3, calibrationFactor, calibrationPercent } = target;
  return {
    dopant,
    densityPerCm3,
    tolerancePercent,
    alongCrystal,
    profile,
    lengthUm,
    backgroundDopant,
    backgroundDensityPerCm3,
    calibrationFactor,
    calibrationPercent,
  };
}
