import type { ExcursionCase } from '@/lib/excursions/types';

/** The stream's charts over the subgroups about a case, with the cursor on the first that it names. */
export function streamSpanAddress({
  stream,
  points,
  first,
}: Pick<ExcursionCase, 'stream' | 'points' | 'first'>): string {
  const [from, to] = [points[0], points.at(-1)];
  if (from === undefined || to === undefined || from === to) return `/streams/${stream.slug}?at=${first.id}`;
  const search = new URLSearchParams({ from: from.at.toISOString(), to: to.at.toISOString(), at: first.id });
  return `/streams/${stream.slug}?${search}`;
}
