import { ensureDemonstrationPeople } from '@/lib/access/demonstration';
import { demonstrationActor, programActor } from '@/lib/access/local-actor';
import type { Actor } from '@/lib/access/actor';
import { getPool } from '@/lib/database/client';
import { takeIds } from '@/lib/database/take-ids';
import { recordMeasurements } from '@/lib/maps/record-measurements';
import { CORRECTIONS, type Measurement } from '@/lib/maps/types';
import { findStreamSettings, listSitePlans, listStreamEvents } from '@/lib/streams/data';
import { createSitePlan, createStream, recordStreamEvent } from '@/lib/streams/mutations';
import type { DemoStream } from './demo-stream';
import type { DemoWafer } from './demo-wafer';
import { lineEvents } from './events';
import { BASELINE_DAY, settleBaseline } from './line-baseline';
import { lineDay } from './line-people';
import { PLANT } from './plant';
import { simulateStream } from './simulate';

/**
 * The instant at which the demonstration line ends, if it is still to be put in: now, where the database holds no
 * stream; where an earlier start was interrupted, the instant that start had chosen. Null where there is nothing to do.
 */
export async function demoDue(now = new Date()): Promise<Date | null> {
  const { rows } = await getPool().query<{ begun: Date | null; streams: boolean }>(
    `SELECT (SELECT started_at FROM intake_batch WHERE origin = 'demonstration' AND source = $1 AND finished_at IS NULL) AS begun,
       EXISTS (SELECT FROM stream) AS streams`,
    [PLANT.name],
  );
  return rows[0]?.begun ?? (rows[0]?.streams ? null : now);
}

/**
 * Fills a database with the demonstration line, by the same way that any wafer takes: its streams, its log, and the
 * wafers of the days before `endAt`, day by day, with what its people did in the evening. It may be interrupted at any
 * instant and begun again: what is there already is passed over. Returns the number of wafers.
 */
export async function seedDemo(say: (text: string) => void, endAt = new Date()): Promise<number> {
  const actor = programActor();
  await ensureDemonstrationPeople();
  const mark = await markBegun(endAt);
  const idOf = await createDemoStreams(actor, PLANT.streams);
  await recordLog(actor, idOf, endAt);
  const measurements: Measurement[] = [];
  for (const stream of PLANT.streams) {
    for (const wafer of simulateStream(stream, { days: PLANT.days, endAt, seed: PLANT.seed })) {
      measurements.push(demoMeasurement(idOf.get(stream.slug) ?? '', stream, wafer));
    }
  }
  measurements.sort((a, b) => a.facts.measuredAt.getTime() - b.facts.measuredAt.getTime());
  const start = new Date(endAt.getTime() - PLANT.days * DAY_MS);
  const onsets = new Map(
    PLANT.mishaps.map((mishap) => [
      mishap.streamSlug,
      { mishap, onset: new Date(start.getTime() + mishap.onsetDay * DAY_MS) },
    ]),
  );
  const batches = await takeIds(getPool(), 'intake_batch', PLANT.days);
  let done = 0;
  for (let day = 1; day <= PLANT.days; day += 1) {
    const evening = new Date(start.getTime() + day * DAY_MS);
    const next = measurements.findIndex(({ facts }, i) => i >= done && facts.measuredAt > evening);
    const ofDay = measurements.slice(done, next === -1 ? undefined : next);
    const batch = { id: batches[day - 1] ?? '', source: `${PLANT.name}, day ${day}`, at: evening, ...SENT };
    await recordMeasurements(actor, batch, ofDay);
    await lineDay(actor, evening, onsets);
    if (day === BASELINE_DAY) {
      const owner = demonstrationActor('process-owner');
      for (const { slug } of PLANT.streams) await settleBaseline(owner, slug, start, evening);
    }
    done += ofDay.length;
    if (day % 10 === 0) say(`Demonstration line: day ${day} of ${PLANT.days}, ${done} wafers.`);
  }
  await getPool().query('UPDATE intake_batch SET finished_at = now() WHERE id = $1', [mark]);
  return done;
}

async function markBegun(endAt: Date): Promise<string> {
  const { rows } = await getPool().query<{ id: string }>(
    `WITH earlier AS (SELECT id FROM intake_batch WHERE origin = 'demonstration' AND source = $1 AND finished_at IS NULL),
       begun AS (INSERT INTO intake_batch (source, origin, actor, started_at)
         SELECT $1, 'demonstration', 'Evenohm', $2 WHERE NOT EXISTS (SELECT FROM earlier) RETURNING id)
     SELECT id FROM earlier UNION ALL SELECT id FROM begun`,
    [PLANT.name, endAt],
  );
  return rows[0]?.id ?? '';
}

async function recordLog(actor: Actor, idOf: ReadonlyMap<string, string>, endAt: Date): Promise<void> {
  for (const event of lineEvents(PLANT.days, endAt)) {
    const streamId = idOf.get(event.streamSlug) ?? '';
    const known = await listStreamEvents(actor, streamId);
    if (!known.some(({ at }) => at.getTime() === event.at.getTime())) {
      await recordStreamEvent(actor, streamId, event);
    }
  }
}

const DAY_MS = 86_400_000;
const SENT = { origin: 'demonstration', history: false, actor: 'Evenohm' } as const;

/** Creates the streams and site plans that are not there yet; a plan is shared by its name. Returns ids by name. */
export async function createDemoStreams(
  actor: Actor,
  streams: readonly DemoStream[],
): Promise<Map<string, string>> {
  const planIds = new Map((await listSitePlans(actor)).map((plan) => [plan.name, plan.id]));
  const idOf = new Map<string, string>();
  for (const stream of streams) {
    const known = await findStreamSettings(actor, stream.slug);
    if (known !== null) {
      idOf.set(stream.slug, known.stream.id);
      continue;
    }
    const { sitePlanName: name, diameterMm, edgeExclusionMm } = stream;
    if (!planIds.has(name)) {
      const orientation = diameterMm <= 150 ? ('flat' as const) : ('notch' as const);
      const plan = { name, diameterMm, edgeExclusionMm, orientation, sites: [...stream.sites] };
      planIds.set(name, valueOf(await createSitePlan(actor, plan)));
    }
    const { slug, kind, step, tool, chamber, recipe, quantity, subgroup, subgroupSize, chartedValue } =
      stream;
    const settings = {
      slug,
      name: stream.name,
      kind,
      step,
      tool,
      chamber,
      recipe,
      quantity,
      subgroup,
      subgroupSize,
      controlStatistic: 'areaMean',
      chartedValue,
      screening: 'outliers',
      repeatabilityPercent: stream.probing.repeatabilityPercent,
      sitePlanId: planIds.get(name) ?? '',
    } as const;
    idOf.set(slug, valueOf(await createStream(actor, settings, stream.target, stream.specification)));
  }
  return idOf;
}

/** A wafer of the demonstration line as if it had come from a gauge. */
export function demoMeasurement(streamId: string, stream: DemoStream, wafer: DemoWafer): Measurement {
  const { values, ...facts } = wafer;
  const { tool, chamber, recipe } = stream;
  return {
    streamId,
    readings: values,
    facts: {
      ...facts,
      tool,
      chamber: chamber || null,
      recipe,
      stage: null,
      correctionsApplied: [...CORRECTIONS],
    },
  };
}

function valueOf(result: { ok: true; value: string } | { ok: false; reason: string }): string {
  if (!result.ok) throw new Error(result.reason);
  return result.value;
}
