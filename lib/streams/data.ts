import type { Actor } from '@/lib/access/actor';
import { getPrisma } from '@/lib/database/client';
import { SETTINGS_INCLUDE, sitePlanOf, streamEventOf, streamOf, streamSettingsOf } from './stream-rows';
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
  const row = await getPrisma().stream.findUnique({ where: { slug }, include: SETTINGS_INCLUDE });
  return row === null ? null : streamSettingsOf(row);
}

/** The settings of several streams by id, in no particular order. */
export async function listStreamSettings(_actor: Actor, ids: readonly string[]): Promise<StreamSettings[]> {
  const rows = await getPrisma().stream.findMany({
    where: { id: { in: ids.map(BigInt) } },
    include: SETTINGS_INCLUDE,
  });
  return rows.map(streamSettingsOf);
}

/** The ids of the streams that bear these names and are in use. */
export async function streamIdsBySlug(_actor: Actor, slugs: readonly string[]): Promise<Map<string, string>> {
  const rows = await getPrisma().stream.findMany({
    where: { slug: { in: [...slugs] }, retiredAt: null },
    select: { id: true, slug: true },
  });
  return new Map(rows.map((row) => [row.slug, row.id.toString()]));
}

export async function listSitePlans(_actor: Actor): Promise<SitePlan[]> {
  return (await getPrisma().sitePlan.findMany({ orderBy: { name: 'asc' } })).map(sitePlanOf);
}

/** The adjustments and maintenance of a stream, newest first. */
export async function listStreamEvents(_actor: Actor, streamId: string): Promise<StreamEvent[]> {
  const rows = await getPrisma().streamEvent.findMany({
    where: { streamId: BigInt(streamId) },
    orderBy: [{ at: 'desc' }, { id: 'desc' }],
  });
  return rows.map(streamEventOf);
}
