import { createHmac, timingSafeEqual } from 'node:crypto';
import { plantKey } from './secret';

export const SESSION_COOKIE_PREFIX = 'evenohm';

/** Cookies are marked Secure, and named __Secure- (RFC 6265bis §4.1.3.1), where the server is reached by https. */
export function hasSecureCookies(publicUrl: string | null): boolean {
  return publicUrl?.startsWith('https:') ?? false;
}

/**
 * The session that a Cookie header proves, or null. better-auth writes `token.signature`, percent-encoded, where the
 * signature is HMAC-SHA256 of the token in base64; a token without it, read out of the database, opens nothing.
 */
export function provenSessionToken(cookies: string | null, publicUrl: string | null): string | null {
  const name = `${hasSecureCookies(publicUrl) ? '__Secure-' : ''}${SESSION_COOKIE_PREFIX}.session_token`;
  const found = cookies?.split(';').find((cookie) => cookie.trimStart().startsWith(`${name}=`));
  const value = decoded(found?.trim().slice(name.length + 1) ?? '');
  const dot = value.lastIndexOf('.');
  if (dot < 1) return null;
  const token = value.slice(0, dot);
  const signature = Buffer.from(value.slice(dot + 1), 'base64');
  const due = createHmac('sha256', plantKey('sessions').toString('base64url')).update(token).digest();
  return signature.length === due.length && timingSafeEqual(signature, due) ? token : null;
}

function decoded(text: string): string {
  try {
    return decodeURIComponent(text);
  } catch {
    return '';
  }
}
