import type { ClientBase, Pool } from 'pg';
import type { Actor } from '@/lib/access/actor';
import type { Measurement, Outcome } from './types';
import { sentContent } from './sent-content';
import { runOrLot } from './wafer-rows';

/** What is on record of these measurements already, and repetitions among themselves; null for the new ones. */
export async function earlierOutcomes(
  _actor: Actor,
  client: ClientBase | Pool,
  measurements: readonly Measurement[],
): Promise<(Outcome | null)[]> {
  const { rows } = await client.query<{ place: number; content_hash: string }>(
    `SELECT given.place::integer - 1 AS place, w.content_hash
     FROM unnest($1::bigint[], $2::text[], $3::text[], $4::timestamptz[]) WITH ORDINALITY
       AS given (stream_id, run_or_lot, wafer, measured_at, place)
     JOIN wafer_measurement w USING (stream_id, run_or_lot, wafer, measured_at)`,
    [
      measurements.map((measurement) => measurement.streamId),
      measurements.map(({ facts }) => runOrLot(facts)),
      measurements.map(({ facts }) => facts.wafer),
      measurements.map(({ facts }) => facts.measuredAt.toISOString()),
    ],
  );
  const known = new Map(rows.map((row) => [row.place, row.content_hash]));
  const seen = new Map<string, string>();
  return measurements.map((measurement, index) => {
    const { streamId, facts } = measurement;
    const identity = JSON.stringify([streamId, runOrLot(facts), facts.wafer, facts.measuredAt.getTime()]);
    const earlier = known.get(index) ?? seen.get(identity);
    const { hash } = sentContent(measurement);
    if (earlier === undefined) {
      seen.set(identity, hash);
      return null;
    }
    if (earlier === hash) return { kind: 'repeated' };
    return {
      kind: 'refused',
      reason: 'this measurement is on record with another content; raw readings are never changed',
    };
  });
}
