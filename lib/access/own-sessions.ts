import { headers } from 'next/headers';
import { getPool } from '@/lib/database/client';
import { readEnvironment } from '@/lib/env';
import type { Actor } from './actor';
import { provenSessionToken } from './session-cookie';

/** A session of one's own that goes on. */
export interface OwnSession {
  startedAt: Date;
  expiresAt: Date;
  ipAddress: string | null;
  userAgent: string | null;
  /** Whether it is the one that asks. */
  isThis: boolean;
}

/** Where someone is signed in, newest first. */
export async function listOwnSessions(actor: Actor): Promise<OwnSession[]> {
  const token = provenSessionToken((await headers()).get('cookie'), readEnvironment().publicUrl);
  const { rows } = await getPool().query<OwnSession>(
    `SELECT created_at AS "startedAt", expires_at AS "expiresAt", ip_address AS "ipAddress",
       user_agent AS "userAgent", token = $2 AS "isThis"
     FROM session WHERE person_id = $1 AND expires_at > now() ORDER BY created_at DESC`,
    [actor.id, token],
  );
  return rows;
}

/** Whether someone signs in by a password of this server, and not only by the identity provider. */
export async function hasOwnPassword(actor: Actor): Promise<boolean> {
  const { rowCount } = await getPool().query(
    `SELECT FROM account WHERE person_id = $1 AND provider_id = 'credential' AND password IS NOT NULL`,
    [actor.id],
  );
  return rowCount === 1;
}
