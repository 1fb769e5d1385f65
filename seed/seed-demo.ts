import { programActor } from '@/lib/access/local-actor';
import type { Actor } from '@/lib/access/actor';
import { getPool } from '@/lib/database/client';
import { takeIds } from '@/lib/database/take-ids';
import { recordMeasurements } from '@/lib/maps/record-measurements';
import { CORRECTIONS, type Measurement } from '@/lib/maps/types';
import { createSitePlan, createStream, recordStreamEvent } from '@/lib/streams/mutations';
import type { DemoStream } from './demo-stream';
import type { DemoWafer } from './demo-wafer';
import { lineEvents } from './events';
import { lineDay } from './line-people';
import { PLANT } from './plant';
import { simulateStream } from './simulate';

/** Whether the database holds no stream yet: only then the demonstration line is put in. */
export async function isEmptyLine(): Promise<boolean> {
  const { rowCount } = await getPool().query('SELECT FROM stream LIMIT 1');
  return rowCount === 0;
}

/**
 * Fills an empty database with the demonstration line, by the same way that any wafer takes: its streams, its log, and
 * the wafers of the days before `endAt` in the order in which they were measured. Returns the number of wafers.
 */
export async function seedDemo(say: (text: string) => void, endAt = new Date()): Promise<number> {
  const actor = programActor();
  const idOf = await createDemoStreams(actor, PLANT.streams);
  for (const event of lineEvents(PLANT.days, endAt)) {
    await recordStreamEvent(actor, idOf.get(event.streamSlug) ?? '', event);
  }
  const measurements: Measurement[] = [];
  for (const stream of PLANT.streams) {
    for (const wafer of simulateStream(stream, { days: PLANT.days, endAt, seed: PLANT.seed })) {
      measurements.push(demoMeasurement(idOf.get(stream.slug) ?? '', stream, wafer));
    }
  }
  measurements.sort((a, b) => a.facts.measuredAt.getTime() - b.facts.measuredAt.getTime());
  const startMs = endAt.getTime() - PLANT.days * DAY_MS;
  const onsets = new Map(
    PLANT.mishaps.map((mishap) => [
      mishap.streamSlug,
      { mishap, onset: new Date(startMs + mishap.onsetDay * DAY_MS) },
    ]),
  );
  const batches = await takeIds(getPool(), 'intake_batch', PLANT.days);
  let done = 0;
  for (let day = 0; day < PLANT.days; day += 1) {
    const evening = new Date(startMs + (day + 1) * DAY_MS);
    const rest = measurements.slice(done);
    const next = rest.findIndex(({ facts }) => facts.measuredAt > evening);
    const ofDay = next === -1 ? rest : rest.slice(0, next);
    const batch = { id: batches[day] ?? '', source: `${PLANT.name}, day ${day + 1}`, at: evening, ...SENT };
    await recordMeasurements(actor, batch, ofDay);
    await lineDay(actor, evening, onsets);
    done += ofDay.length;
    if (day % 10 === 9) say(`Demonstration line: day ${day + 1} of ${PLANT.days}, ${done} wafers.`);
  }
  return done;
}

const DAY_MS = 86_400_000;
const SENT = { origin: 'demonstration', history: false, actor: 'Evenohm' } as const;

/** Creates streams with their site plans; streams that share a plan's name share the plan. Returns ids by name. */
export async function createDemoStreams(
  actor: Actor,
  streams: readonly DemoStream[],
): Promise<Map<string, string>> {
  const planIds = new Map<string, string>();
  const idOf = new Map<string, string>();
  for (const stream of streams) {
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
