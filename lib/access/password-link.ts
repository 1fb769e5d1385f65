import { createHash, randomBytes } from 'node:crypto';
import type { ClientBase } from 'pg';

/** A link by which someone chooses a password is good for so long, once. */
export const LINK_DAYS = 3;

/**
 * Writes a code by which a person chooses a password, in place of any before, and returns it. It is what the accounts
 * library takes at its /reset-password, which keeps identifiers as their SHA-256 in base64url.
 */
export async function writePasswordLink(client: ClientBase, personId: string): Promise<string> {
  const code = randomBytes(32).toString('base64url');
  await client.query('DELETE FROM verification WHERE value = $1', [personId]);
  await client.query(
    'INSERT INTO verification (id, identifier, value, expires_at) VALUES ($1, $2, $3, now() + make_interval(days => $4))',
    [randomBytes(16).toString('hex'), linkIdentifier(code), personId, LINK_DAYS],
  );
  return code;
}

/** What the accounts library knows a code by. */
export function linkIdentifier(code: string): string {
  return createHash('sha256').update(`reset-password:${code}`).digest('base64url');
}
