import { forbidden, redirect } from 'next/navigation';
import { may, type Actor } from '@/lib/access/actor';
import { isDemonstrationOffered } from '@/lib/access/demonstration';
import { isFirstAdministratorDue } from '@/lib/access/first-administrator';
import type { Permission } from '@/lib/access/permission';
import { findActor, requestedAddress } from '@/lib/access/request-actor';
import { refusedPermission } from './refused-permission';

/**
 * Whoever asks for this page, proven to have the permission it needs. Nobody is led to the sign-in page and back;
 * someone who may not is told so, with status 403.
 */
export async function signedIn(permission: Permission): Promise<Actor> {
  const actor = await findActor();
  if (actor === null) redirect(await signInAddress());
  if (may(actor, permission)) return actor;
  refusedPermission().permission = permission;
  forbidden();
}

async function signInAddress(): Promise<string> {
  if (!isDemonstrationOffered() && (await isFirstAdministratorDue())) return '/first-administrator';
  const next = await requestedAddress();
  return next === '/' ? '/sign-in' : `/sign-in?next=${encodeURIComponent(next)}`;
}
