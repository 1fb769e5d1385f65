/** An address that asks for one page of a long list by state and stream; what is usual is left out. */
export function listAddress(
  path: string,
  query: { state?: string; stream: string | null; page: number },
): string {
  const search = new URLSearchParams();
  if (query.state !== undefined && query.state !== 'unclosed') search.set('state', query.state);
  if (query.stream !== null) search.set('stream', query.stream);
  if (query.page > 1) search.set('page', String(query.page));
  const text = search.toString();
  return text === '' ? path : `${path}?${text}`;
}
