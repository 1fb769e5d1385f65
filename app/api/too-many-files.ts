import type { Actor } from '@/lib/access/actor';
import { intakeAllowance } from '@/lib/access/allowance';
import { AppError, problemResponse } from '@/lib/errors';

/** The answer to someone who sends files faster than is allowed, with when to go on; null for everyone else. */
export function tooManyFiles(actor: Actor): Response | null {
  const waitS = intakeAllowance.waitS(actor);
  if (waitS === 0) return null;
  const error = new AppError('too-many', `Too many files at once. Wait ${waitS} s, then go on.`);
  return problemResponse(error, { 'retry-after': String(waitS) });
}
