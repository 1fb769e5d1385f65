import { getPool } from '@/lib/database/client';
import { AppError } from '@/lib/errors';
import { may, type Actor } from './actor';
import { isFourEyes } from './four-eyes';
import type { Permission } from './permission';
import { refusalOf } from './refusal';
import type { Person, TokenOnRecord } from './types';

const PEOPLE = `SELECT p.id, p.name, p.email, p.demonstration, p.deactivated_at AS "deactivatedAt",
    (SELECT coalesce(json_agg(json_build_object('role', g.role, 'streamIds', g.stream_ids::text[])), '[]')
     FROM role_grant g WHERE g.person_id = p.id) AS grants,
    (SELECT count(*)::integer FROM session s WHERE s.person_id = p.id AND s.expires_at > now()) AS sessions,
    (SELECT max(s.created_at) FROM session s WHERE s.person_id = p.id) AS "lastSignInAt",
    ARRAY(SELECT DISTINCT CASE provider_id WHEN 'credential' THEN 'password' ELSE 'provider' END
          FROM account a WHERE a.person_id = p.id ORDER BY 1) AS "signsInBy"
  FROM person p`;

/** Everybody, by name; those of the demonstration line last. */
export async function listPeople(actor: Actor): Promise<Person[]> {
  insist(actor, 'manage-people');
  const { rows } = await getPool().query<Person>(`${PEOPLE} ORDER BY p.demonstration, lower(p.name), p.id`);
  return rows;
}

export async function findPerson(actor: Actor, id: string): Promise<Person | null> {
  insist(actor, 'manage-people');
  // PostgreSQL refuses to look for text that holds NUL.
  if (!/^[\w-]+$/.test(id)) return null;
  const { rows } = await getPool().query<Person>(`${PEOPLE} WHERE p.id = $1`, [id]);
  return rows[0] ?? null;
}

/** Every token, newest first. */
export async function listTokens(actor: Actor): Promise<TokenOnRecord[]> {
  insist(actor, 'manage-tokens');
  const { rows } = await getPool().query<TokenOnRecord>(
    `SELECT id, name, prefix, scope, stream_ids::text[] AS "streamIds", created_by AS "createdBy",
       created_at AS "createdAt", expires_at AS "expiresAt", revoked_at AS "revokedAt", revoked_by AS "revokedBy",
       last_used_at AS "lastUsedAt"
     FROM access_token ORDER BY created_at DESC, id DESC`,
  );
  return rows;
}

/** Whether limits may be approved only by someone other than who drew them up. */
export function findFourEyes(actor: Actor): Promise<boolean> {
  return isFourEyes(actor, getPool());
}

function insist(actor: Actor, permission: Permission): void {
  if (!may(actor, permission)) throw new AppError('forbidden', refusalOf(permission));
}
