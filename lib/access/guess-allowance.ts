import { createHash } from 'node:crypto';
import { Allowance } from './allowance';
import { AppError, problemResponse } from '@/lib/errors';

/**
 * Wrong passwords for one e-mail address, wherever they come from: at most eighty in an hour and sixty in each after
 * (OWASP ASVS 4.0, 2.2.1, from memory, allows a hundred). Somebody who keeps guessing makes the person wait up to a minute
 * to sign in; sessions that go on are not touched.
 */
const guesses = new Allowance({ burst: 20, perSecond: 1 / 60 });

/**
 * Lets a sign-in by password through while there is something left of what may be guessed for its address, known or
 * not; otherwise the answer is 429. `body` is what the sign-in page sends.
 */
export async function withinGuesses(body: string, signIn: () => Promise<Response>): Promise<Response> {
  const email = emailOf(body);
  if (email === null) return signIn();
  const account = { kind: 'person', id: createHash('sha256').update(email).digest('base64') } as const;
  const waitS = guesses.waitS(account);
  if (waitS > 0) {
    const error = new AppError('too-many', 'Too many tries for this address.');
    return problemResponse(error, { 'retry-after': String(waitS) });
  }
  const answer = await signIn();
  if (answer.status !== 401) guesses.giveBack(account);
  return answer;
}

/** The address as the accounts library looks it up. */
function emailOf(body: string): string | null {
  try {
    const { email } = JSON.parse(body) as { email?: unknown };
    return typeof email === 'string' ? email.toLowerCase() : null;
  } catch {
    return null;
  }
}
