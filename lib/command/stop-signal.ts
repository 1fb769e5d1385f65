/** Aborts at the first SIGINT or SIGTERM; a second one ends the process at once. */
export function stopSignal(): AbortSignal {
  const controller = new AbortController();
  for (const name of ['SIGINT', 'SIGTERM'] as const) {
    process.on(name, () => {
      if (controller.signal.aborted) process.exit(130);
      controller.abort();
    });
  }
  return controller.signal;
}
