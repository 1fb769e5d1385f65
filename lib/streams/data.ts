import type { ClientBase, Pool } from 'pg';
import type { Actor } from '@/lib/access/actor';
import { getPrisma } from '@/lib/database/client';
import { settingsWhere } from './settings-query';
import { sitePlanOf, streamEventOf, streamOf } from './stream-rows';
import type { SitePlan, Stream, StreamEvent, StreamSettings } from './types';

/** All streams in use, by name; with `retired` those out of use as well. */
export async function listStreams(_actor: Actor, options: { retired?: boolean } = {}): Promise<Stream[]> {
  const rows = await getPrisma().stream.findMany({
    where: options.retired ? {} : { retiredAt: null },
    include: { sitePlan: true },
    orderBy: { name: 'asc' },
  });
  return rows.map(streamOf);
}

/** The settings of one stream by the name that stands in addresses and files; null when there is none. */
export async function findStreamSettings(_actor: Actor, slug: string): Promise<StreamSettings | null> {
  return (await settingsWhere('s.slug = $1', [slug]))[0] ?? null;
}

/** The settings of several streams by id, by name; within a transaction by its client. */
export function listStreamSettings(
  _actor: Actor,
  ids: readonly string[],
  client?: ClientBase | Pool,
): Promise<StreamSettings[]> {
  return settingsWhere('s.id = ANY($1::bigint[])', [ids], client);
}

/** The settings of every stream in use, by name. */
export function listSettingsInUse(_actor: Actor): Promise<StreamSettings[]> {
  return settingsWhere('s.retired_at IS NULL', []);
}

/** The settings of the streams in use of one tool and chamber, by name. */
export function listToolSettings(
  _actor: Actor,
  { tool, chamber }: Pick<Stream, 'tool' | 'chamber'>,
): Promise<StreamSettings[]> {
  return settingsWhere('s.retired_at IS NULL AND s.tool = $1 AND s.chamber = $2', [tool, chamber]);
}

export async function listSitePlans(_actor: Actor): Promise<SitePlan[]> {
  return (await getPrisma().sitePlan.findMany({ orderBy: { name: 'asc' } })).map(sitePlanOf);
}

/** The adjustments and maintenance of a stream, newest first; from `since` on and at most `most`, where given. */
export async function listStreamEvents(
  _actor: Actor,
  streamId: string,
  options: { since?: Date; most?: number } = {},
): Promise<StreamEvent[]> {
  const { since, most } = options;
  const rows = await getPrisma().streamEvent.findMany({
    where: { streamId: BigInt(streamId), ...(since && { at: { gte: since } }) },
    orderBy: [{ at: 'desc' }, { id: 'desc' }],
    ...(most !== undefined && { take: most }),
  });
  return rows.map(streamEventOf);
}
