import type { Actor } from '@/lib/access/actor';
import { readEnvironment } from '@/lib/env';
import { findStreamSpan, findStreamStanding, listSpanWafers } from '@/lib/excursions/data';
import type { SpanWafer } from '@/lib/excursions/span-wafers';
import { findStreamSettings } from '@/lib/streams/data';
import { spanWish } from './span-wish';

/** The same stretch as the page shows for the same words in the address, with every subgroup and wafer of it. */
export async function readCsvSpan(actor: Actor, slug: string, address: string) {
  const settings = /^[a-z0-9][a-z0-9-]*$/.test(slug) ? await findStreamSettings(actor, slug) : null;
  if (settings === null) return null;
  const search = Object.fromEntries(new URL(address).searchParams);
  const { wish } = spanWish(search, readEnvironment().siteTimeZone);
  const { stream } = settings;
  const [span, standing] = await Promise.all([
    findStreamSpan(actor, stream.id, wish),
    findStreamStanding(actor, stream.id, new Date()),
  ]);
  const ids = span.points.map((point) => point.id);
  const wafers = await listSpanWafers(actor, stream.id, ids);
  const wafersOf = new Map<string, SpanWafer[]>();
  for (const wafer of wafers) {
    wafersOf.set(wafer.subgroupId, [...(wafersOf.get(wafer.subgroupId) ?? []), wafer]);
  }
  const isFiltered = wish.gauge !== null || wish.lot !== null;
  const unit = stream.quantity === 'resistivity' ? 'ohm_cm' : 'ohm_sq';
  return { settings, standing, points: span.points, wafers, wafersOf, isFiltered, unit };
}

export type CsvSpan = NonNullable<Awaited<ReturnType<typeof readCsvSpan>>>;
