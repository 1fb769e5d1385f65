import type { ClientBase } from 'pg';
import type { Actor } from '@/lib/access/actor';
import { audited } from '@/lib/access/audited';
import { refuse } from '@/lib/access/refusal';
import type { Target } from '@/lib/physics/target';
import { insertSpecification, insertTarget, targetFacts } from './revision-rows';
import type { Result, SitePlan, Specification, Stream } from './types';

/** From the beginning: the first revision of a target or specification holds for old wafers too. */
const FIRST = { effectiveFrom: new Date(0), reason: 'first of the stream' };

/** Creates a site plan. */
export async function createSitePlan(actor: Actor, plan: Omit<SitePlan, 'id'>): Promise<Result<string>> {
  const refusal = refuse(actor, 'create-stream');
  if (refusal) return refusal;
  const { name, diameterMm, edgeExclusionMm, orientation, sites } = plan;
  const id = await unlessTaken(() =>
    audited(actor, async (client, tell) => {
      const { rows } = await client.query<{ id: string }>(
        `INSERT INTO site_plan (name, diameter_mm, edge_exclusion_mm, orientation, x_mm, y_mm, created_by)
         VALUES ($1, $2, $3, $4, $5, $6, $7) RETURNING id`,
        [
          ...[name, diameterMm, edgeExclusionMm, orientation],
          ...[sites.map((site) => site.xMm), sites.map((site) => site.yMm), actor.name],
        ],
      );
      const planId = rows[0]?.id ?? '';
      const after = { name, diameterMm, sites: sites.length };
      tell({ action: 'created a site plan', subject: { kind: 'site-plan', id: planId }, after });
      return planId;
    }),
  );
  return id === null
    ? { ok: false, reason: `There is a site plan "${name}" already.` }
    : { ok: true, value: id };
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
  const { slug, name, kind, screening } = stream;
  const id = await unlessTaken(() =>
    audited(actor, async (client, tell) => {
      const streamId = await insertStream(actor, client, stream);
      if (target !== null) await insertTarget(actor, client, streamId, target, FIRST);
      if (specification !== null) await insertSpecification(actor, client, streamId, specification, FIRST);
      tell({
        action: 'created a stream',
        subject: { kind: 'stream', id: streamId },
        streamId,
        after: {
          name,
          slug,
          kind,
          screening,
          ...(target === null ? {} : targetFacts(target)),
          ...specification,
        },
      });
      return streamId;
    }),
  );
  return id === null
    ? { ok: false, reason: `There is a stream "${slug}" already.` }
    : { ok: true, value: id };
}

async function insertStream(actor: Actor, client: ClientBase, stream: NewStream): Promise<string> {
  const { rows } = await client.query<{ id: string }>(
    `INSERT INTO stream (slug, name, kind, step, tool, chamber, recipe, quantity, site_plan_id, subgroup, subgroup_size,
       control_statistic, charted_value, screening, repeatability_percent, created_by)
     VALUES ($1, $2, $3, $4, $5, $6, $7, $8, $9, $10, $11, $12, $13, $14, $15, $16) RETURNING id`,
    [
      ...[stream.slug, stream.name, stream.kind, stream.step, stream.tool, stream.chamber, stream.recipe],
      ...[stream.quantity, stream.sitePlanId, stream.subgroup, stream.subgroupSize, stream.controlStatistic],
      ...[stream.chartedValue, stream.screening, stream.repeatabilityPercent, actor.name],
    ],
  );
  return rows[0]?.id ?? '';
}

/** What was created; null where its name was taken already, by another at the same time perhaps. */
async function unlessTaken<Created>(create: () => Promise<Created>): Promise<Created | null> {
  try {
    return await create();
  } catch (error) {
    // PostgreSQL documentation, appendix A: unique_violation.
    if (error instanceof Error && 'code' in error && error.code === '23505') return null;
    throw error;
  }
}
