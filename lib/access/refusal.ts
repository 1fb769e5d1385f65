import { may, type Actor, type Identity } from './actor';
import { PERMISSIONS, type Permission } from './permission';

/**
 * What is said to someone who may not do a thing.
 *
 * @example refusalOf('approve-limits') // 'Your roles do not allow this: approve limits.'
 */
export function refusalOf(permission: Permission, kind: Identity['kind'] = 'person'): string {
  const { words } = PERMISSIONS[permission];
  const who = kind === 'token' ? 'This token does' : 'Your roles do';
  return `${who} not allow this: ${words.charAt(0).toLowerCase()}${words.slice(1)}.`;
}

/**
 * The outcome of a mutation for someone who may not do it, or null for someone who may. Entry points ask before they
 * parse; a mutation asks again once it knows the stream, because the id it was given may be of another one.
 */
export function refuse(
  actor: Actor,
  permission: Permission,
  streamId?: string,
): { ok: false; reason: string } | null {
  return may(actor, permission, streamId) ? null : { ok: false, reason: refusalOf(permission, actor.kind) };
}
