import { randomBytes } from 'node:crypto';
import { type IncomingMessage, type Server, type ServerResponse, createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { AppError } from '@/lib/errors';
import { ADDRESS_HEADER } from '@/lib/access/requested-address';
import { answerUnavailable } from './answer-unavailable';
import { limitBodyTime, LONGEST_BODY_MS } from './limit-body-time';
import { projectRoot } from './project-root';
import { requestGate } from './request-gate';
import { securityHeaders } from './security-headers';

interface WebServerOptions {
  host: string;
  port: number;
  dev: boolean;
  publicUrl: string | null;
  trustedProxy: string | null;
  /** Whether the database is away: then pages and data are answered 503 until it is back. */
  isAway(): boolean;
}

/** A web server that listens. Until `open` is called it answers 503: the address is held while the app is built. */
export interface WebServer {
  address: string;
  open(): Promise<void>;
  close(): Promise<void>;
}

type Handler = (request: IncomingMessage, response: ServerResponse) => Promise<void>;

const graceMs = 5000;
const STARTING = 'Evenohm is starting.';
const AWAY = 'The database does not answer just now; Evenohm is opening it again.';

export async function startWebServer(options: WebServerOptions): Promise<WebServer> {
  let handle: Handler = async (request, response) => answerUnavailable(request, response, STARTING);
  const running = new Set<ServerResponse>();
  const server = createServer((request, response) => {
    running.add(response);
    response.once('close', () => running.delete(response));
    limitBodyTime(request, response);
    if (!prepare(request, response, options)) return;
    const isAsset = request.url?.startsWith('/_next/') === true;
    if (options.isAway() && !isAsset) answerUnavailable(request, response, AWAY);
    else void handle(request, response);
  });
  server.requestTimeout = LONGEST_BODY_MS;
  const port = await listen(server, options);
  const address = options.publicUrl ?? `http://${bracketed(options.host)}:${port}`;
  let closeApp: () => Promise<void> = async () => undefined;
  return {
    address,
    open: async () => {
      const { default: next } = await import('next');
      const app = next({
        dev: options.dev,
        dir: projectRoot,
        hostname: options.host,
        port,
        httpServer: server,
      });
      closeApp = () => app.close();
      await app.prepare();
      handle = app.getRequestHandler();
    },
    close: async () => {
      await drain(server, running);
      await closeApp();
    },
  };
}

/** Sets what every request needs; false where it was refused and answered. */
function prepare(request: IncomingMessage, response: ServerResponse, options: WebServerOptions): boolean {
  forgetForwarding(request, options.trustedProxy);
  const { headers } = request;
  headers[ADDRESS_HEADER] = request.url ?? '/';
  const { method = 'GET', url: target = '/' } = request;
  const gate = { method, target, host: headers.host, origin: headers.origin };
  const refusal = requestGate(gate, options.publicUrl);
  if (refusal !== null) {
    const { status, reason } = refusal;
    response.writeHead(status, { 'content-type': 'application/problem+json', connection: 'close' });
    response.end(JSON.stringify({ type: 'about:blank', status, detail: reason }));
    return false;
  }
  const nonce = randomBytes(16).toString('base64');
  const https = options.publicUrl?.startsWith('https:') ?? false;
  const set = securityHeaders(nonce, { dev: options.dev, https });
  for (const [name, value] of Object.entries(set)) response.setHeader(name, value);
  /** Next finds the nonce for its own scripts in the request's policy. */
  headers['content-security-policy'] = set['content-security-policy'];
  return true;
}

/** What a client says about who it is stands only if the trusted proxy said it. */
function forgetForwarding(request: IncomingMessage, trustedProxy: string | null): void {
  const peer = (request.socket.remoteAddress ?? '').replace(/^::ffff:/, '');
  if (trustedProxy !== null && peer === trustedProxy) return;
  delete request.headers['x-forwarded-host'];
  delete request.headers['x-forwarded-proto'];
  delete request.headers.forwarded;
  request.headers['x-forwarded-for'] = peer;
}

function listen(server: Server, { host, port }: WebServerOptions): Promise<number> {
  return new Promise((resolve, reject) => {
    server.once('error', (error: NodeJS.ErrnoException) => {
      const reason = error.code === 'EADDRINUSE' ? 'another program listens there' : error.message;
      const hint = 'set PORT to another port';
      reject(new AppError('unavailable', `Cannot listen on ${bracketed(host)}:${port}: ${reason}; ${hint}.`));
    });
    server.listen(port, host, () => resolve((server.address() as AddressInfo).port));
  });
}

/** Takes no new request, lets running ones finish for a while, and cuts event streams, which never end. */
async function drain(server: Server, running: Set<ServerResponse>): Promise<void> {
  const closed = new Promise<void>((resolve) => server.close(() => resolve()));
  for (const response of running) {
    if (String(response.getHeader('content-type')).startsWith('text/event-stream')) response.destroy();
  }
  server.closeIdleConnections();
  const cut = setTimeout(() => server.closeAllConnections(), graceMs);
  await closed;
  clearTimeout(cut);
}

function bracketed(host: string): string {
  return host.includes(':') ? `[${host}]` : host;
}
