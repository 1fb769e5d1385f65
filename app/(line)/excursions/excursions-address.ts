import type { ExcursionQuery } from '@/lib/excursions/schema';

/** An address that asks for these excursions; what is usual is left out. */
export function excursionsAddress(path: string, query: ExcursionQuery): string {
  const search = new URLSearchParams();
  if (query.state !== 'unclosed') search.set('state', query.state);
  if (query.stream !== null) search.set('stream', query.stream);
  if (query.page > 1) search.set('page', String(query.page));
  const text = search.toString();
  return text === '' ? path : `${path}?${text}`;
}
