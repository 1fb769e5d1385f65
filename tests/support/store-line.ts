import type { Pool } from 'pg';
import { commandActor } from '@/lib/access/local-actor';
import { getPool } from '@/lib/database/client';
import { takeIds } from '@/lib/database/take-ids';
import type { LimitSet } from '@/lib/control/limit-set';
import { approveLimits, enterInheritedLimits } from '@/lib/limits/mutations';
import { recordMeasurements } from '@/lib/maps/record-measurements';
import type { Batch } from '@/lib/maps/record-statement';
import { CORRECTIONS, type Measurement, type MeasurementFacts, type Outcome } from '@/lib/maps/types';
import { createSitePlan, createStream, type NewStream } from '@/lib/streams/mutations';
import type { Specification } from '@/lib/streams/types';
import { polarSites } from '@/lib/wafer/polar-sites';

export const actor = commandActor();
const SITES = polarSites(1, 90);
const HOUR_MS = 3_600_000;
export const START = Date.UTC(2021, 3, 1);

/** The instant at which wafer `i` of a stream was processed: one an hour. */
export const hour = (i: number) => new Date(START + i * HOUR_MS);

/** The one site plan of each database. */
const planIds = new WeakMap<Pool, Promise<string>>();

async function sitePlan(): Promise<string> {
  const plan = {
    name: 'nine',
    diameterMm: 200,
    edgeExclusionMm: 0,
    orientation: 'notch' as const,
    sites: SITES,
  };
  const made = await createSitePlan(actor, plan);
  if (!made.ok) throw new Error(made.reason);
  return made.value;
}

let streams = 0;

/** A new stream of boron wafers read at nine sites. Returns its id and its name in files. */
export async function newStream(
  fields: Partial<NewStream> = {},
  specification: Partial<Specification> | null = null,
): Promise<{ id: string; slug: string }> {
  const planId = planIds.get(getPool()) ?? sitePlan();
  planIds.set(getPool(), planId);
  const slug = `stream-${(streams += 1)}`;
  const created = await createStream(
    actor,
    {
      slug,
      name: slug,
      kind: 'substrate',
      step: 'incoming',
      tool: '',
      chamber: '',
      recipe: '',
      quantity: 'resistivity',
      sitePlanId: await planId,
      subgroup: 'wafer',
      subgroupSize: 1,
      controlStatistic: 'mean',
      chartedValue: 'statistic',
      screening: 'outliers',
      repeatabilityPercent: 0.2,
      ...fields,
    },
    null,
    specification && {
      meanLower: null,
      meanUpper: null,
      siteLower: null,
      siteUpper: null,
      nonuniformityMetric: null,
      nonuniformityUpper: null,
      ...specification,
    },
  );
  if (!created.ok) throw new Error(created.reason);
  return { id: created.value, slug };
}

/** Limits about 10 Ω·cm with σ = 0.1; spread within a wafer from 0.5 to 2 %. */
const LIMITS: LimitSet = {
  n: 100,
  level: { centre: 10, sigma: 0.1, lower: 9.7, upper: 10.3 },
  movingRange: { centre: 0.1128, upper: 0.4243 },
  within: { logMean: 0, logSigma: 0.2, lower: 0.5, centre: 1, upper: 2 },
  between: null,
};

/** Gives a stream approved limits from before its first wafer: then its signals do not depend on the order of arrival. */
export async function settleLimits(
  streamId: string,
  effectiveFrom = new Date(START - HOUR_MS),
): Promise<void> {
  await enterInheritedLimits(actor, streamId, LIMITS, effectiveFrom, 'in use before');
  const { rows } = await getPool().query<{ id: string }>(
    `SELECT id FROM limit_revision WHERE stream_id = $1 AND state = 'draft'`,
    [streamId],
  );
  const approved = await approveLimits(actor, rows[0]?.id ?? '', { reason: 'as before', effectiveFrom });
  if (!approved.ok) throw new Error(approved.reason);
}

/** Quiet levels about 10 Ω·cm: within 1 σ, on alternate sides. */
export const quietLevel = (i: number) => 10 + (i % 2 === 0 ? 0.05 : -0.05) * (1 + 0.3 * Math.sin(i * i));

/** Wafer `i` of a stream: nine readings about a level, with about 1 % spread. */
export function wafer(
  streamId: string,
  i: number,
  level = quietLevel(i),
  facts: Partial<MeasurementFacts> = {},
): Measurement {
  const spread = 0.01 * (1 + 0.1 * Math.sin(7 * i));
  const shape = SITES.map((_, site) => Math.cos((2 * Math.PI * site) / SITES.length) * Math.SQRT2 * spread);
  return {
    streamId,
    readings: shape.map((deviation) => level * (1 + deviation)),
    facts: {
      lot: null,
      run: null,
      wafer: `W${String(i).padStart(4, '0')}`,
      slot: null,
      measuredAt: hour(i),
      processedAt: hour(i),
      stage: null,
      tool: null,
      chamber: null,
      recipe: null,
      gauge: null,
      operator: null,
      temperatureC: null,
      thicknessUm: null,
      ingotFraction: null,
      correctionsApplied: [...CORRECTIONS],
      note: null,
      ...facts,
    },
  };
}

export async function newBatch(history = false): Promise<Batch> {
  const [id = ''] = await takeIds(getPool(), 'intake_batch', 1);
  return { id, source: 'test', origin: 'command', history, actor: actor.name };
}

export async function record(measurements: readonly Measurement[], history = false): Promise<Outcome[]> {
  return recordMeasurements(actor, await newBatch(history), measurements);
}

/** One after the other, as a gauge sends them. */
export async function recordInTurn(measurements: readonly Measurement[], history = false): Promise<void> {
  for (const measurement of measurements) await record([measurement], history);
}

/** All that is on record of a stream's judgement, under names instead of ids. */
export async function judgementOf(streamId: string) {
  const pool = getPool();
  const { rows: points } = await pool.query(
    `SELECT s.key, s.position_at, s.state, s.history, s.level, s.within, s.between, s.moving_range, s.completions,
       l.revision, (SELECT array_agg(w.wafer ORDER BY w.wafer) FROM wafer_measurement w WHERE w.id = ANY(s.wafer_ids)) AS wafers,
       (SELECT array_agg(regexp_replace(f, '^[0-9]+:', '') ORDER BY 1) FROM unnest(s.specification) f) AS specification
     FROM subgroup s LEFT JOIN limit_revision l ON l.stream_id = s.stream_id AND l.id = s.limit_revision_id
     WHERE s.stream_id = $1 ORDER BY s.position_at, s.key`,
    [streamId],
  );
  const { rows: signals } = await pool.query<{ chart: string; rule: string; first: string; last: string }>(
    `SELECT g.chart, g.rule, g.side, g.completions, l.revision, f.key AS first, t.key AS last,
       (SELECT array_agg(p.key ORDER BY p.position_at, p.key) FROM subgroup p WHERE p.id = ANY(g.participant_ids)) AS participants
     FROM signal g JOIN subgroup f ON f.id = g.first_subgroup_id JOIN subgroup t ON t.id = g.last_subgroup_id
       LEFT JOIN limit_revision l ON l.id = g.limit_revision_id
     WHERE g.stream_id = $1 AND g.withdrawn_at IS NULL ORDER BY f.position_at, g.chart, g.rule, g.side, f.key`,
    [streamId],
  );
  return { points, signals };
}

/** The rules that a stream's signals name now, as chart:rule. */
export async function rulesOf(streamId: string): Promise<string[]> {
  const { signals } = await judgementOf(streamId);
  return signals.map(({ chart, rule }) => `${chart}:${rule}`);
}

/** The excursions of a stream, oldest first. */
export async function casesOf(streamId: string) {
  const { rows } = await getPool().query<{ id: string; chart: string; family: string; state: string }>(
    'SELECT id, chart, family, state FROM excursion WHERE stream_id = $1 ORDER BY id',
    [streamId],
  );
  return rows;
}

/** How many rows each table holds that intake writes. */
export async function rowCounts() {
  const { rows } = await getPool().query(
    `SELECT (SELECT count(*)::integer FROM wafer_measurement) AS wafers, (SELECT count(*)::integer FROM wafer_reading) AS maps,
       (SELECT count(*)::integer FROM subgroup) AS subgroups, (SELECT count(*)::integer FROM signal) AS signals,
       (SELECT count(*)::integer FROM excursion) AS excursions`,
  );
  return rows[0] as Record<'wafers' | 'maps' | 'subgroups' | 'signals' | 'excursions', number>;
}

/** The text of a wafer-map file that holds these measurements. */
export function fileText(slug: string, measurements: readonly Measurement[]): string {
  const rows = measurements.flatMap(({ facts, readings }) =>
    readings.map((value, i) =>
      [
        slug,
        facts.lot ?? '',
        facts.run ?? '',
        facts.wafer,
        facts.measuredAt.toISOString(),
        SITES[i]?.xMm,
        SITES[i]?.yMm,
        value ?? '',
      ].join(),
    ),
  );
  return ['stream,lot,run,wafer,measured_at,x_mm,y_mm,resistivity_ohm_cm', ...rows, ''].join('\n');
}
