import type { Actor } from './actor';
import { audited } from './audited';
import { areStreams } from './are-streams';
import { refuse } from './refusal';
import { newToken, tokenHash, tokenPrefix } from './token-text';
import type { AccessResult } from './types';

export interface NewToken {
  name: string;
  scope: 'read' | 'intake';
  /** The streams a token for intake may record wafers of; null: all. Reading is of all streams. */
  streamIds: readonly string[] | null;
  days: number;
}

/** Makes a token and returns it, the only time that it is seen. */
export async function makeToken(actor: Actor, wish: NewToken): Promise<AccessResult<string>> {
  const refusal = refuse(actor, 'manage-tokens');
  if (refusal) return refusal;
  const { name, scope, days } = wish;
  const streamIds = scope === 'read' ? null : wish.streamIds;
  const token = newToken();
  const prefix = tokenPrefix(token);
  return audited(actor, async (client, tell) => {
    if (streamIds !== null && !(await areStreams(client, streamIds))) {
      return { ok: false, reason: 'One of the streams does not exist.' };
    }
    const { rows } = await client.query<{ id: string }>(
      `INSERT INTO access_token (name, hash, prefix, scope, stream_ids, created_by, expires_at)
       VALUES ($1, $2, $3, $4, $5, $6, now() + make_interval(days => $7)) RETURNING id`,
      [name, tokenHash(token), prefix, scope, streamIds, actor.name, days],
    );
    const after = { name, begins: prefix, scope, streams: streamIds ?? 'all', days };
    tell({ action: 'made a token', subject: { kind: 'token', id: rows[0]?.id ?? '' }, after });
    return { ok: true, value: token };
  });
}

/** Revokes a token: from now on it opens nothing. It stays on record. */
export async function revokeToken(actor: Actor, tokenId: string): Promise<AccessResult> {
  const refusal = refuse(actor, 'manage-tokens');
  if (refusal) return refusal;
  return audited(actor, async (client, tell) => {
    const { rows } = await client.query<{ name: string; begins: string }>(
      `UPDATE access_token SET revoked_at = now(), revoked_by = $2 WHERE id = $1 AND revoked_at IS NULL
       RETURNING name, prefix AS begins`,
      [tokenId, actor.name],
    );
    const [found] = rows;
    if (found === undefined)
      return { ok: false, reason: 'There is no such token, or it is revoked already.' };
    tell({ action: 'revoked a token', subject: { kind: 'token', id: tokenId }, before: found });
    return { ok: true, value: undefined };
  });
}
