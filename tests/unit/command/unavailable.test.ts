import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startWebServer, type WebServer } from '@/lib/command/web-server';

let away = false;
let server: WebServer;

beforeAll(async () => {
  const plain = { host: '127.0.0.1', port: 0, dev: false, publicUrl: null, trustedProxy: null };
  server = await startWebServer({ ...plain, isAway: () => away });
});
afterAll(() => server.close());

const ask = (init: RequestInit) => fetch(`${server.address}/streams`, init);

describe('a server that cannot answer yet, or not just now', () => {
  it('says so with 503 in a page that asks again by itself', async () => {
    for (const [isAway, words] of [
      [false, 'Evenohm is starting.'],
      [true, 'The database does not answer just now'],
    ] as const) {
      away = isAway;
      const response = await ask({ headers: { accept: 'text/html,*/*' } });
      expect([response.status, response.headers.get('retry-after')]).toEqual([503, '3']);
      const page = await response.text();
      expect(page).toContain(words);
      expect(page).toContain('http-equiv="refresh"');
    }
  });

  it('tells a program in problem details (RFC 9457)', async () => {
    away = true;
    const response = await ask({ headers: { accept: 'application/json' } });
    expect(response.headers.get('content-type')).toBe('application/problem+json');
    expect(await response.json()).toMatchObject({ status: 503, title: 'Service Unavailable' });
  });

  it('never lets a browser send by itself again what it sent', async () => {
    away = true;
    const response = await ask({ method: 'POST', body: 'a=1', headers: { accept: 'text/html' } });
    expect(response.status).toBe(503);
    const page = await response.text();
    expect(page).not.toContain('http-equiv');
    expect(page).toContain('was not taken');
  });
});
