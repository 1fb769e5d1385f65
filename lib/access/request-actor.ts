import { headers } from 'next/headers';
import { cache } from 'react';
import { getPool } from '@/lib/database/client';
import { readEnvironment } from '@/lib/env';
import { provenActor, type Actor, type Grant } from './actor';
import { isDemonstrationOffered } from './demonstration';
import { isFromThisMachine } from './first-administrator';
import { requestOrigin } from './request-origin';
import { ADDRESS_HEADER, siteAddress } from './requested-address';
import { provenSessionToken } from './session-cookie';
import { findTokenActor } from './token-actor';

interface PersonRow {
  id: string;
  name: string;
  demonstration: boolean;
  grants: Grant[];
}

/** Whoever asks for this page or sends this form; null for nobody. Looked up once a request. */
export const findActor = cache(async (): Promise<Actor | null> => actorOfHeaders(await headers()));

/** Whoever sends this request to a route: by a session's cookie, or by a token in the header Authorization (RFC 6750). */
export function findRequestActor(request: Request): Promise<Actor | null> {
  return actorOfHeaders(request.headers);
}

async function actorOfHeaders(sent: Headers): Promise<Actor | null> {
  const bearer = /^Bearer (\S+)$/i.exec(sent.get('authorization') ?? '')?.[1];
  if (bearer !== undefined) return findTokenActor(bearer);
  const environment = readEnvironment();
  const token = provenSessionToken(sent.get('cookie'), environment.publicUrl);
  return token === null ? null : findSessionActor(token, isDemonstrationOffered(environment));
}

/** Whose session it is, while it lasts and they count: one prepared statement. */
async function findSessionActor(token: string, withDemonstration: boolean): Promise<Actor | null> {
  const { rows } = await getPool().query<PersonRow>({
    name: 'session-actor',
    text: `SELECT p.id, p.name, p.demonstration,
        (SELECT coalesce(json_agg(json_build_object('role', g.role, 'streamIds', g.stream_ids::text[])), '[]')
         FROM role_grant g WHERE g.person_id = p.id) AS grants
      FROM session s JOIN person p ON p.id = s.person_id
      WHERE s.token = $1 AND s.expires_at > now() AND p.deactivated_at IS NULL`,
    values: [token],
  });
  const [person] = rows;
  if (person === undefined || (person.demonstration && !withDemonstration)) return null;
  const { id, name, grants } = person;
  return provenActor({ kind: 'person', id, name, grants });
}

/** The address that the page being made was asked for by, to come back to after sign-in. */
export async function requestedAddress(): Promise<string> {
  return siteAddress((await headers()).get(ADDRESS_HEADER));
}

/** The origin by which this server was asked, for links that are handed on. */
export async function requestedOrigin(): Promise<string> {
  return requestOrigin(await headers());
}

/** Whether the page being made was asked for at the machine itself. */
export async function isAskedAtMachine(): Promise<boolean> {
  return isFromThisMachine(await headers());
}
