import { may, type Actor } from '@/lib/access/actor';
import type { Permission } from '@/lib/access/permission';
import { refusalOf } from '@/lib/access/refusal';
import { findRequestActor } from '@/lib/access/request-actor';
import { isSameOrigin } from '@/lib/access/same-origin';
import { AppError, problemResponse } from '@/lib/errors';

const READS = ['GET', 'HEAD'];

/**
 * Whoever sends this request, proven to have the permission its route needs, or the problem to answer with: 401 for
 * nobody, 403 for someone who may not. A session's cookie comes along with requests that other sites provoke, so what
 * changes something must come from a page of this server; a token is shown on purpose.
 */
export async function routeActor(request: Request, permission: Permission): Promise<Actor | Response> {
  const actor = await findRequestActor(request);
  if (actor === null) return nobody();
  if (actor.kind !== 'token' && !READS.includes(request.method) && !isSameOrigin(request.headers)) {
    return problemResponse(new AppError('forbidden', 'Changes are taken from pages of this server only.'));
  }
  return may(actor, permission)
    ? actor
    : problemResponse(new AppError('forbidden', refusalOf(permission, actor.kind)));
}

/** RFC 9110 §11.6.1 asks for a challenge beside 401. */
function nobody(): Response {
  const detail =
    'Sign in, or show a token in the header Authorization: one that is known, in force and not revoked.';
  return new Response(JSON.stringify({ type: 'about:blank', title: 'Unauthorized', status: 401, detail }), {
    status: 401,
    headers: { 'content-type': 'application/problem+json', 'www-authenticate': 'Bearer realm="Evenohm"' },
  });
}
