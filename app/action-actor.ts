import { may, type Actor } from '@/lib/access/actor';
import type { Permission } from '@/lib/access/permission';
import { refusalOf } from '@/lib/access/refusal';
import { findActor } from '@/lib/access/request-actor';

/**
 * Whoever sends this form, proven to have the permission its action needs; otherwise what the form says instead. It
 * stays as it was: someone whose session ended meanwhile loses nothing of what was typed.
 */
export async function actionActor(
  permission: Permission,
): Promise<{ ok: true; actor: Actor } | { ok: false; reason: string }> {
  const actor = await findActor();
  if (actor === null) {
    return {
      ok: false,
      reason: 'You are signed out. Sign in in another tab and send this again: what you typed stays here.',
    };
  }
  return may(actor, permission) ? { ok: true, actor } : { ok: false, reason: refusalOf(permission) };
}
