import { createHmac, randomBytes } from 'node:crypto';
import type { Role } from '@/lib/access/permission';
import { plantKey } from '@/lib/access/secret';
import { getPool } from '@/lib/database/client';

/** Enters a person with one role into the open database and signs them in; returns the Cookie header of their session. */
export async function sessionOf(role: Role): Promise<string> {
  const id = randomBytes(8).toString('hex');
  const token = randomBytes(24).toString('base64url');
  const pool = getPool();
  await pool.query('INSERT INTO person (id, name, email) VALUES ($1, $2, $3)', [
    id,
    role,
    `${id}@plant.example`,
  ]);
  await pool.query('INSERT INTO role_grant (person_id, role, granted_by) VALUES ($1, $2, $3)', [
    id,
    role,
    'test',
  ]);
  await pool.query(
    `INSERT INTO session (id, person_id, token, expires_at) VALUES ($1, $1, $2, now() + interval '12 hours')`,
    [id, token],
  );
  const key = plantKey('sessions').toString('base64url');
  const signature = createHmac('sha256', key).update(token).digest('base64');
  return `evenohm.session_token=${encodeURIComponent(`${token}.${signature}`)}`;
}
