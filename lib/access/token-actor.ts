import { getPool } from '@/lib/database/client';
import { provenActor, type Actor } from './actor';
import { tokenHash } from './token-text';

interface TokenRow {
  id: string;
  name: string;
  scope: 'read' | 'intake';
  streamIds: string[] | null;
  isStale: boolean;
}

/** Last use is written at most so often: a busy gauge must not write a row with every wafer. */
const USE_KEPT_FOR = '1 minute';

/**
 * Whom a token stands for; null where it is unknown, expired or revoked. One prepared look-up, and a write where its
 * last use on record is older than a minute.
 */
export async function findTokenActor(text: string): Promise<Actor | null> {
  const hash = tokenHash(text);
  if (hash === null) return null;
  const { rows } = await getPool().query<TokenRow>({
    name: 'token-actor',
    text: `SELECT id, name, scope, stream_ids AS "streamIds",
        (last_used_at IS NULL OR last_used_at < now() - interval '${USE_KEPT_FOR}') AS "isStale"
      FROM access_token WHERE hash = $1 AND revoked_at IS NULL AND expires_at > now()`,
    values: [hash],
  });
  const found = rows[0];
  if (found === undefined) return null;
  if (found.isStale) {
    await getPool().query(
      `UPDATE access_token SET last_used_at = now()
       WHERE id = $1 AND (last_used_at IS NULL OR last_used_at < now() - interval '${USE_KEPT_FOR}')`,
      [found.id],
    );
  }
  const { id, name, scope, streamIds } = found;
  return provenActor({ kind: 'token', id, name: `${name} (token)`, grants: [], token: { scope, streamIds } });
}
