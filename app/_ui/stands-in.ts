export interface NavPlace {
  href: string;
  label: string;
  /** Other paths whose pages belong to this place. */
  covers?: readonly string[];
}

const within = (path: string, root: string) => path === root || path.startsWith(`${root}/`);

/**
 * Whether the page at `path` is the place itself (`page`), lies within it (`true`) or elsewhere (`false`):
 * the value of `aria-current`. A place at `/` holds only what it covers, not the whole site.
 *
 * @example standsIn('/setup/targets', { href: '/setup', label: 'Setup' }) // true
 */
export function standsIn(path: string, place: NavPlace): 'page' | true | false {
  if (path === place.href) return 'page';
  const roots = [...(place.href === '/' ? [] : [place.href]), ...(place.covers ?? [])];
  return roots.some((root) => within(path, root));
}
