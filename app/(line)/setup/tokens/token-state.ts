import type { TokenOnRecord } from '@/lib/access/types';

/** How things stand with a token at an instant. */
export function tokenState(
  token: Pick<TokenOnRecord, 'revokedAt' | 'expiresAt'>,
  now: Date,
): 'in force' | 'revoked' | 'expired' {
  if (token.revokedAt !== null) return 'revoked';
  return token.expiresAt <= now ? 'expired' : 'in force';
}
