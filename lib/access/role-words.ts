import type { Grant } from './actor';
import { PERMISSIONS, ROLE_WORDS, type Permission } from './permission';

/**
 * The roles that have a permission, in words.
 *
 * @example rolesThatMay('approve-limits') // 'process owners'
 */
export function rolesThatMay(permission: Permission): string {
  const plural = PERMISSIONS[permission].roles.map((role) => `${ROLE_WORDS[role]}s`);
  return listed(plural);
}

/**
 * What someone is here, in words; streams are named by whoever knows their names.
 *
 * @example grantWords({ role: 'viewer', streamIds: null }, new Map()) // 'viewer'
 */
export function grantWords({ role, streamIds }: Grant, nameOf: ReadonlyMap<string, string>): string {
  if (streamIds === null) return ROLE_WORDS[role];
  return `${ROLE_WORDS[role]} for ${listed(streamIds.map((id) => nameOf.get(id) ?? `stream ${id}`))}`;
}

function listed(words: readonly string[]): string {
  return words.length < 2 ? words.join('') : `${words.slice(0, -1).join(', ')} and ${words.at(-1)}`;
}
