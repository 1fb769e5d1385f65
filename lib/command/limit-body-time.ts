import type { IncomingMessage, ServerResponse } from 'node:http';

/** Half a gigabyte through a slow line takes its time. */
export const LONGEST_BODY_MS = 3_600_000;
/** Everything else that is sent is a form. */
const FORM_BODY_MS = 60_000;

/** Whoever was answered before all had come may read that, and is not heard to the end. */
const ANSWERED_MS = 10_000;

const FILES = ['/api/maps', '/api/intake'];

/**
 * Cuts off a client whose form takes longer than a minute to come, so that nobody holds connections by sending a byte
 * now and then. The places where files are sent wait as long as the server waits at all, but not for what was refused
 * meanwhile.
 */
export function limitBodyTime(
  request: IncomingMessage,
  response: ServerResponse,
  { formMs, answeredMs } = { formMs: FORM_BODY_MS, answeredMs: ANSWERED_MS },
): void {
  const cutAfter = (ms: number) => {
    const cut = setTimeout(() => {
      if (!request.complete) request.socket.destroy();
    }, ms).unref();
    const stop = () => clearTimeout(cut);
    request.once('end', stop).once('close', stop);
  };
  const path = (request.url ?? '').split('?')[0] ?? '';
  if (!FILES.includes(path)) cutAfter(formMs);
  response.once('finish', () => {
    if (!request.complete) cutAfter(answeredMs);
  });
}
