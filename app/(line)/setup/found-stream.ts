import { notFound } from 'next/navigation';
import type { Actor } from '@/lib/access/actor';
import { findStreamSettings } from '@/lib/streams/data';
import type { StreamSettings } from '@/lib/streams/types';

/** The stream that an address names, or the page that says there is none. */
export async function foundStream(actor: Actor, params: Promise<{ slug: string }>): Promise<StreamSettings> {
  const found = await findStreamSettings(actor, (await params).slug.slice(0, 200));
  if (found === null) notFound();
  return found;
}
