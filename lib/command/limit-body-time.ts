import type { IncomingMessage } from 'node:http';

/** Half a gigabyte through a slow line takes its time. */
export const LONGEST_BODY_MS = 3_600_000;
/** Everything else that is sent is a form. */
const FORM_BODY_MS = 60_000;

const FILES = ['/api/maps', '/api/intake'];

/**
 * Cuts off a client whose form takes longer than a minute to come, so that nobody holds connections by sending a byte
 * now and then. The places where files are sent wait as long as the server waits at all.
 */
export function limitBodyTime(request: IncomingMessage, formMs = FORM_BODY_MS): void {
  const path = (request.url ?? '').split('?')[0] ?? '';
  if (request.complete || FILES.includes(path)) return;
  const cut = setTimeout(() => {
    if (!request.complete) request.socket.destroy();
  }, formMs).unref();
  const stop = () => clearTimeout(cut);
  request.once('end', stop).once('close', stop);
}
