import { createServer } from 'node:net';

/** A port on loopback that nobody listens on just now. */
export function freePort(): Promise<number> {
  return new Promise((resolve) => {
    const probe = createServer().listen(0, '127.0.0.1', () => {
      const address = probe.address();
      probe.close(() => resolve(address !== null && typeof address === 'object' ? address.port : 0));
    });
  });
}
