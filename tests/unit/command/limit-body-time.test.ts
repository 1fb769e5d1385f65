import { createServer, type Server } from 'node:http';
import { connect, type AddressInfo } from 'node:net';
import { setTimeout as sleep } from 'node:timers/promises';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { limitBodyTime } from '@/lib/command/limit-body-time';

const FORM_MS = 150;
let server: Server;

beforeAll(async () => {
  server = createServer((request, response) => {
    limitBodyTime(request, response, { formMs: FORM_MS, answeredMs: FORM_MS });
    request.on('error', () => undefined);
    if (request.url === '/api/intake') response.writeHead(401).end('refused');
    else request.resume().once('end', () => setTimeout(() => response.end('taken'), 2 * FORM_MS));
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
});
afterAll(() => {
  server.closeAllConnections();
  server.close();
});

/** Sends a request of ten bytes, the last of them after some time; what came back, and whether the line was cut. */
async function send(path: string, lastAfterMs: number): Promise<{ text: string; cut: boolean }> {
  const socket = connect((server.address() as AddressInfo).port, '127.0.0.1');
  let text = '';
  let cut = false;
  socket.on('data', (part) => (text += String(part)));
  socket.on('error', () => undefined);
  socket.once('close', () => (cut = true));
  socket.write(`POST ${path} HTTP/1.1\r\nHost: localhost\r\nContent-Length: 10\r\n\r\n123456789`);
  await sleep(lastAfterMs);
  if (!cut) socket.write('0');
  await sleep(4 * FORM_MS);
  socket.destroy();
  return { text, cut };
}

describe('a body that is sent slowly', () => {
  test('is cut off where forms are sent', async () => {
    expect(await send('/api/auth/sign-in/email', 3 * FORM_MS)).toEqual({ text: '', cut: true });
  });

  test('is waited for where files are sent', async () => {
    expect((await send('/api/maps?sound', 3 * FORM_MS)).text).toContain('taken');
  });

  test('is not waited for where its file was refused meanwhile', async () => {
    const { text, cut } = await send('/api/intake', 3 * FORM_MS);
    expect(text).toContain('refused');
    expect(cut).toBe(true);
  });

  test('has no time limit on its answer once it has come', async () => {
    expect((await send('/sign-in', 0)).text).toContain('taken');
  });
});
