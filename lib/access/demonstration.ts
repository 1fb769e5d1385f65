import { isLoopbackName } from './is-loopback-name';
import { ROLES, ROLE_WORDS, type Role } from './permission';
import { getPool } from '@/lib/database/client';
import { type Environment, readEnvironment } from '@/lib/env';

/**
 * Whether anybody may look round as one of the people of the demonstration line: only while it is on and nobody but
 * this machine can reach the server.
 */
export function isDemonstrationOffered(environment: Environment = readEnvironment()): boolean {
  const { demo, host, publicUrl, trustedProxy } = environment;
  return demo && isLoopbackName(host) && publicUrl === null && trustedProxy === null;
}

/** The id of the person who shows a role; they have no password, so that there is none to guess. */
export function demonstrationId(role: Role): string {
  return `demonstration-${role}`;
}

export function demonstrationName(role: Role): string {
  return `${ROLE_WORDS[role]} (demonstration)`;
}

/** Puts in the people of the demonstration line, one for each role and for all streams, where they are missing. */
export async function ensureDemonstrationPeople(): Promise<void> {
  const people = ROLES.map((role) => ({
    id: demonstrationId(role),
    name: demonstrationName(role),
    // RFC 2606 §2: a name under .invalid belongs to nobody.
    email: `${role}@demonstration.invalid`,
    role,
  }));
  await getPool().query(
    `WITH given AS (SELECT * FROM jsonb_to_recordset($1) AS p (id text, name text, email text, role text)),
       made AS (INSERT INTO person (id, name, email, demonstration) SELECT id, name, email, true FROM given
         ON CONFLICT DO NOTHING RETURNING id)
     INSERT INTO role_grant (person_id, role, granted_by)
     SELECT id, role, 'Evenohm' FROM given WHERE id IN (SELECT id FROM made)`,
    [JSON.stringify(people)],
  );
}
