import type { ClientBase, Pool } from 'pg';
import type { Actor } from '@/lib/access/actor';
import { loadLines } from '@/lib/excursions/data';
import { LINE_DEPTH, type Line } from '@/lib/excursions/line';
import { listStreamSettings } from '@/lib/streams/data';
import { measuringStream, type MeasuringStream } from './measured-wafer';

/** All that recording a wafer of one stream needs at hand: how to measure it, and the end of the stream's charts. */
export interface Desk {
  by: MeasuringStream;
  line: Line;
}

const desks = new WeakMap<Pool, Map<string, Desk>>();
const means = new WeakMap<Pool, Map<string, MeasuringStream>>();

/** Keeps a desk's line short: what a later wafer in order needs, with some room for late ones. */
const KEPT_POINTS = LINE_DEPTH + 20;

/**
 * Takes the desk of a stream out of the process's own stock, if it is there. It is put back after its work has been
 * committed and thrown away otherwise; whether it is still true is decided by the stream's version when it writes.
 */
export function takeDesk(pool: Pool, streamId: string): Desk | null {
  const stock = desks.get(pool);
  const desk = stock?.get(streamId) ?? null;
  stock?.delete(streamId);
  return desk;
}

/** Puts a desk back after what it wrote was committed and the stream's version grew by one. */
export function putDeskBack(pool: Pool, desk: Desk): void {
  const { line } = desk;
  line.version = (BigInt(line.version) + 1n).toString();
  if (line.points.length > 2 * KEPT_POINTS) {
    line.points = line.points.slice(-KEPT_POINTS);
    line.whole = false;
    const kept = new Set(line.points.map((point) => point.id));
    line.signals = line.signals.filter((signal) => kept.has(signal.lastId));
  }
  const stock = desks.get(pool) ?? new Map<string, Desk>();
  desks.set(pool, stock.set(line.streamId, desk));
  const known = means.get(pool) ?? new Map<string, MeasuringStream>();
  means.set(pool, known.set(line.streamId, desk.by));
}

/** How the stream's wafers were measured last, also while its desk is taken; null where nobody has been at it. */
export function latestMeans(pool: Pool, streamId: string): MeasuringStream | null {
  return means.get(pool)?.get(streamId) ?? null;
}

/**
 * Desks loaded afresh: each line from the given instant on. The line comes first: its version is then no newer than the
 * settings, and whoever changes these meanwhile makes it out of date.
 */
export async function loadDesks(
  actor: Actor,
  client: ClientBase | Pool,
  wishes: readonly { streamId: string; from: number }[],
): Promise<Desk[]> {
  const lines = await loadLines(actor, client, wishes);
  const settings = await listStreamSettings(
    actor,
    wishes.map((wish) => wish.streamId),
    client,
  );
  const byId = new Map(settings.map((one) => [one.stream.id, one]));
  return lines.flatMap((line) => {
    const found = byId.get(line.streamId);
    return found === undefined ? [] : [{ by: measuringStream(found), line }];
  });
}

/** Whether a line reaches back far enough to take a wafer at this position in order. */
export function reachesBackTo(line: Line, at: number): boolean {
  return line.whole || (line.points[LINE_DEPTH]?.at ?? Infinity) <= at;
}
