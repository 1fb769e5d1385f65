import { AppError, problemResponse } from '@/lib/errors';
import { accounts } from './accounts';
import { AUTH_PATHS } from './auth-paths';
import { requestOrigin } from './request-origin';
import { chainAccessEvents } from './chain-access-events';
import { withinGuesses } from './guess-allowance';
import { isSameOrigin } from './same-origin';

const ROOT = '/api/auth';
/** No form of ours comes near it. */
const MOST_BODY_BYTES = 16_384;

/**
 * Answers a request below /api/auth by the accounts library, for those of its endpoints that are in use. What it wrote
 * is taken into the audit trail before the answer goes out.
 */
export async function answerAuth(request: Request): Promise<Response> {
  const asked = new URL(request.url);
  const path = asked.pathname.slice(ROOT.length);
  if (!AUTH_PATHS.some((known) => known === `${request.method} ${path}`)) {
    return problemResponse(new AppError('not-found', 'There is nothing at this address.'));
  }
  if (request.method === 'POST' && !isSameOrigin(request.headers)) {
    return problemResponse(new AppError('forbidden', 'Sign-in is taken from pages of this server only.'));
  }
  if (
    Number(request.headers.get('content-length') ?? Infinity) > MOST_BODY_BYTES &&
    request.method === 'POST'
  ) {
    return problemResponse(new AppError('invalid', 'The body is too large, or its length is not given.'));
  }
  const url = `${requestOrigin(request.headers)}${ROOT}${path}${asked.search}`;
  const body = request.method === 'POST' ? await request.text() : undefined;
  const ask = () =>
    accounts().handler(
      new Request(url, { method: request.method, headers: request.headers, ...(body ? { body } : {}) }),
    );
  const answer = path === '/sign-in/email' ? await withinGuesses(body ?? '', ask) : await ask();
  await chainAccessEvents();
  const wait = answer.headers.get('x-retry-after');
  if (wait !== null) answer.headers.set('retry-after', wait);
  answer.headers.set('cache-control', 'no-store');
  return answer;
}
