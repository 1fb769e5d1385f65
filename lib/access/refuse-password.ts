import { APIError, createAuthMiddleware, getSessionFromCtx } from 'better-auth/api';
import { getPool } from '@/lib/database/client';
import { passwordFault } from './password-fault';
import { linkIdentifier } from './password-link';

/**
 * Asked before the accounts library sets a password: it checks lengths, and that the one before or the link's code is
 * right; that a password is no common one and not its person's own name or address is ours.
 */
export const refusePassword = createAuthMiddleware(async (context) => {
  const { path } = context;
  if (path !== '/change-password' && path !== '/reset-password') return;
  const { newPassword, token } = (context.body ?? {}) as { newPassword?: unknown; token?: unknown };
  if (typeof newPassword !== 'string') return;
  const person = path === '/change-password' ? (await getSessionFromCtx(context))?.user : await ofLink(token);
  const fault = passwordFault(newPassword, person ? [person.name, person.email] : []);
  if (fault !== null) throw new APIError('BAD_REQUEST', { code: 'PASSWORD_FAULT', message: fault });
});

/** Whose link carries a code. */
async function ofLink(code: unknown): Promise<{ name: string; email: string } | undefined> {
  if (typeof code !== 'string') return undefined;
  const { rows } = await getPool().query<{ name: string; email: string }>(
    `SELECT name, email FROM verification JOIN person ON person.id = verification.value WHERE identifier = $1`,
    [linkIdentifier(code)],
  );
  return rows[0];
}
