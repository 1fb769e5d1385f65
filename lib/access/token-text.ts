import { createHash, randomBytes } from 'node:crypto';

/** Every token begins so, that a stray one is known for what it is. */
const MARK = 'ev_';
const TOKEN = /^ev_[A-Za-z0-9_-]{43}$/;
/** So much of a token is kept to tell it from others: the mark and 24 of its 256 bits. */
const SHOWN = MARK.length + 4;

/** A new token: 32 random bytes (RFC 4648 §5 base64url) behind the mark. It is shown once and never kept. */
export function newToken(): string {
  return MARK + randomBytes(32).toString('base64url');
}

/** The beginning of a token, by which people tell it from others. */
export function tokenPrefix(token: string): string {
  return token.slice(0, SHOWN);
}

/**
 * What is kept of a token: its SHA-256. A plain digest is enough, since nobody can try 2²⁵⁶ tokens as they try
 * passwords. Null for what is no token at all.
 */
export function tokenHash(token: string): Buffer | null {
  return TOKEN.test(token) ? createHash('sha256').update(token).digest() : null;
}
