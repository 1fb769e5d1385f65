import type { IncomingMessage, ServerResponse } from 'node:http';
import { AppError, problemOf } from '@/lib/errors';

const RETRY_SECONDS = 3;

/**
 * Answers 503 (RFC 9110 §15.6.4) while nothing else can: to a browser a page in words that asks again by itself
 * (what was only read; what was sent is not sent twice), to a program problem details (RFC 9457). `reason` is one
 * sentence of ours, not text from outside.
 */
export function answerUnavailable(request: IncomingMessage, response: ServerResponse, reason: string): void {
  const wantsPage = request.headers.accept?.includes('text/html') === true;
  const isRead = request.method === 'GET' || request.method === 'HEAD';
  response.writeHead(503, {
    'content-type': wantsPage ? 'text/html; charset=utf-8' : 'application/problem+json',
    'retry-after': String(RETRY_SECONDS),
    'cache-control': 'no-store',
    /** A long upload would otherwise have to be read to its end. */
    ...(isRead ? {} : { connection: 'close' }),
  });
  response.end(
    wantsPage ? page(reason, isRead) : JSON.stringify(problemOf(new AppError('unavailable', reason))),
  );
}

function page(reason: string, isRead: boolean): string {
  const next = isRead
    ? 'This page asks again by itself.'
    : 'What you sent just now was not taken: go back and send it again in a moment.';
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width">
<meta name="color-scheme" content="light dark">
${isRead ? `<meta http-equiv="refresh" content="${RETRY_SECONDS}">\n` : ''}<title>Evenohm</title>
</head>
<body style="font: 1rem/1.5 system-ui, sans-serif; margin: 3rem auto; max-width: 36rem; padding: 0 1rem">
<h1 style="font-size: 1.25rem">${reason}</h1>
<p>What is recorded is untouched. ${next}</p>
</body>
</html>
`;
}
