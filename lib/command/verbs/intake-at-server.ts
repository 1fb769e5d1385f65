import { createReadStream } from 'node:fs';
import { request as httpRequest, type IncomingMessage } from 'node:http';
import { request as httpsRequest } from 'node:https';
import { basename } from 'node:path';
import { pipeline } from 'node:stream/promises';
import { setTimeout as sleep } from 'node:timers/promises';
import { z } from 'zod';
import { isLoopbackName } from '@/lib/access/is-loopback-name';
import { readEnvironment } from '@/lib/env';
import { AppError } from '@/lib/errors';
import type { IntakeResult } from '@/lib/maps/types';
import { UsageError } from '../verb';

export type Taken = Omit<IntakeResult, 'batchId'>;

const answerOf = z.object({
  recorded: z.number(),
  repeated: z.number(),
  refused: z.number(),
  refusals: z.array(
    z.object({
      file: z.string(),
      line: z.number().nullable(),
      column: z.string().nullable(),
      measurement: z.string().nullable(),
      reason: z.string(),
    }),
  ),
  notices: z.array(z.string()),
});
const problem = z.object({ detail: z.string() });

/** Asked to wait, it tries again so often. */
const MOST_TRIES = 20;

/**
 * Sends files to the server of others, with the token of EVENOHM_TOKEN, each streamed from where it lies. It follows no
 * redirection: a token is for the server that was named.
 */
export function intakeAtServer(server: string, query: URLSearchParams, say: (text: string) => void) {
  const token = readEnvironment().token;
  if (token === null) throw new UsageError('--server needs a token of that server in EVENOHM_TOKEN');
  const address = serverAddress(server);
  if (address.protocol === 'http:' && !isLoopbackName(address.hostname.replace(/^\[|\]$/g, ''))) {
    say(`${address.origin} is reached without encryption: the token can be read on the way.`);
  }
  address.search = query.toString();
  return async (path: string): Promise<Taken> => {
    for (let tries = 1; ; tries += 1) {
      const { status, headers, text } = await sent(address, token, path);
      if (status === 429 && tries < MOST_TRIES) {
        await sleep(1000 * Math.min(60, Number(headers['retry-after']) || 1));
        continue;
      }
      const taken = answerOf.safeParse(json(text));
      if (taken.success && (status === 200 || status === 422)) return taken.data;
      const told = problem.safeParse(json(text));
      const why = told.success ? told.data.detail : `it answered with status ${status}`;
      throw new AppError('unavailable', `${basename(path)}: ${address.host} did not take it: ${why}`);
    }
  };
}

function serverAddress(server: string): URL {
  const given = URL.canParse(server) ? new URL(server) : null;
  if (given === null || !/^https?:$/.test(given.protocol) || given.username !== '') {
    throw new UsageError('--server is the address of a server, such as https://evenohm.plant.example');
  }
  return new URL('/api/maps', given);
}

/** Sends one file. No time limit but the server's: half a gigabyte through a slow line takes its time. */
async function sent(address: URL, token: string, path: string) {
  const ask = address.protocol === 'https:' ? httpsRequest : httpRequest;
  const outgoing = ask(address, {
    method: 'POST',
    headers: {
      authorization: `Bearer ${token}`,
      'content-type': 'text/csv',
      'x-file-name': encodeURIComponent(basename(path)),
    },
  });
  const answered = new Promise<IncomingMessage>((resolve, reject) => {
    outgoing.once('response', resolve);
    outgoing.once('error', reject);
  });
  try {
    // A server that refuses answers before it has read all: then what is left need not be sent.
    const sending = pipeline(createReadStream(path), outgoing).catch(() => undefined);
    const answer = await answered;
    let text = '';
    for await (const chunk of answer.setEncoding('utf8')) text += String(chunk);
    if (!outgoing.writableFinished) outgoing.destroy();
    await sending;
    return { status: answer.statusCode ?? 0, headers: answer.headers, text };
  } catch (error) {
    outgoing.destroy();
    const reason = error instanceof Error ? error.message : String(error);
    throw new AppError('unavailable', `${address.host} cannot be reached: ${reason}`, { cause: error });
  }
}

function json(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return null;
  }
}
