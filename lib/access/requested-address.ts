/** The header in which the web server hands the asked address, path and query, to the pages; a client's own is overwritten. */
export const ADDRESS_HEADER = 'x-evenohm-address';

/**
 * An address of this site to go on to after sign-in; the board for anything else. Two slashes, or a backslash that
 * browsers take for one, would lead to another site.
 *
 * @example siteAddress('//elsewhere.example') // '/'
 */
export function siteAddress(given: string | null | undefined): string {
  if (!given || !/^\/(?![/\\])/.test(given)) return '/';
  const { origin, pathname, searchParams } = new URL(given, 'http://here');
  if (origin !== 'http://here' || pathname.startsWith('//')) return '/';
  searchParams.delete('_rsc');
  const query = searchParams.toString();
  return query === '' ? pathname : `${pathname}?${query}`;
}
