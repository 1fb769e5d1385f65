/** npm sends its child on what the terminal has sent it already: Ctrl-C under `npm start` arrives twice. */
const ONE_PRESS_MS = 500;

/**
 * Aborts at the first SIGINT or SIGTERM. A later one ends the process at once; what follows within half a second is
 * the same press of Ctrl-C, and must not leave the database running.
 */
export function stopSignal(): AbortSignal {
  const controller = new AbortController();
  let firstAt = 0;
  for (const name of ['SIGINT', 'SIGTERM'] as const) {
    process.on(name, () => {
      const now = performance.now();
      if (!controller.signal.aborted) {
        firstAt = now;
        controller.abort();
      } else if (now - firstAt > ONE_PRESS_MS) process.exit(130);
    });
  }
  return controller.signal;
}
