import { readFileSync, writeFileSync } from 'node:fs';
import { createServer } from 'node:net';
import { AppError } from '@/lib/errors';

/** The port of last time where it is free, else a random free one: an address noted elsewhere stays good. */
export async function settledPort(file: string): Promise<number> {
  const port = (await freePort(lastPort(file))) ?? (await freePort(0));
  if (port === null) throw new AppError('unavailable', 'No free port for the database.');
  writeFileSync(file, String(port), { mode: 0o600 });
  return port;
}

function lastPort(file: string): number {
  try {
    return Number(readFileSync(file, 'utf8')) || 0;
  } catch {
    return 0;
  }
}

function freePort(wanted: number): Promise<number | null> {
  return new Promise((resolve) => {
    const probe = createServer();
    probe.once('error', () => resolve(null));
    probe.listen(wanted, '127.0.0.1', () => {
      const address = probe.address();
      const port = address !== null && typeof address === 'object' ? address.port : null;
      probe.close(() => resolve(port));
    });
  });
}
