import { randomBytes } from 'node:crypto';
import { createWriteStream } from 'node:fs';
import { mkdir, readdir, readFile, rename, rm, stat, writeFile } from 'node:fs/promises';
import path from 'node:path';
import { Readable, Transform } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import type { ReadableStream as NodeStream } from 'node:stream/web';
import type { Actor } from '@/lib/access/actor';
import { readEnvironment } from '@/lib/env';
import { fileBytes } from './file-bytes';
import type { FileSource } from './file-check';

/** Files larger than this are for the command line, which reads them where they are. */
export const MOST_FILE_BYTES = 600_000_000;

/** A file that nobody recorded is thrown away after a day. */
const KEPT_MS = 24 * 3_600_000;

/** A file that was sent and waits to be recorded. */
export interface WaitingFile extends FileSource {
  token: string;
  bytes: number;
  sentAt: Date;
}

const TOKEN = /^[0-9a-f]{32}$/;
const folder = () => path.join(readEnvironment().dataFolder, 'waiting');
const pathOf = (token: string, part: 'csv' | 'name' | 'taken') => path.join(folder(), `${token}.${part}`);

/**
 * Streams a file that is being sent into the private folder under the data folder, under a random name; its own name
 * is kept beside it as text and never used as a path. Returns the token by which it is found again.
 */
export async function keepWaitingFile(
  _actor: Actor,
  name: string,
  body: ReadableStream<Uint8Array>,
  most = MOST_FILE_BYTES,
): Promise<{ ok: true; token: string } | { ok: false; reason: string }> {
  await mkdir(folder(), { recursive: true, mode: 0o700 });
  await dropStaleFiles();
  const token = randomBytes(16).toString('hex');
  let bytes = 0;
  const counted = new Transform({
    transform(chunk: Buffer, _encoding, done) {
      bytes += chunk.length;
      done(bytes > most ? new TooLarge() : null, chunk);
    },
  });
  try {
    await pipeline(
      Readable.fromWeb(body as NodeStream<Uint8Array>),
      counted,
      createWriteStream(pathOf(token, 'csv'), { mode: 0o600, flags: 'wx' }),
    );
  } catch (error) {
    await rm(pathOf(token, 'csv'), { force: true });
    if (!(error instanceof TooLarge)) throw error;
    return { ok: false, reason: tooLargeWords(most) };
  }
  await writeFile(pathOf(token, 'name'), plainName(name), { mode: 0o600, flag: 'wx' });
  return { ok: true, token };
}

class TooLarge extends Error {}

export function tooLargeWords(most = MOST_FILE_BYTES): string {
  return `The file is larger than ${most / 1e6} MB. Send it in parts, or record it on the command line: npx evenohm intake.`;
}

/** A waiting file by its token; null when there is none, or it is being recorded. */
export async function findWaitingFile(_actor: Actor, token: string): Promise<WaitingFile | null> {
  return TOKEN.test(token) ? openFile(token, 'csv') : null;
}

/** Takes a waiting file for recording, so that nobody records it a second time meanwhile; null when it is gone. */
export async function claimWaitingFile(_actor: Actor, token: string): Promise<WaitingFile | null> {
  if (!TOKEN.test(token)) return null;
  try {
    await rename(pathOf(token, 'csv'), pathOf(token, 'taken'));
  } catch (error) {
    if (isMissing(error)) return null;
    throw error;
  }
  return openFile(token, 'taken');
}

/** Puts a claimed file back: recording it failed, and it can be tried again. */
export async function releaseWaitingFile(_actor: Actor, token: string): Promise<void> {
  if (TOKEN.test(token)) await rename(pathOf(token, 'taken'), pathOf(token, 'csv'));
}

/** Throws a waiting or claimed file away. */
export async function dropWaitingFile(_actor: Actor, token: string): Promise<void> {
  if (!TOKEN.test(token)) return;
  for (const part of ['csv', 'taken', 'name'] as const) await rm(pathOf(token, part), { force: true });
}

async function openFile(token: string, part: 'csv' | 'taken'): Promise<WaitingFile | null> {
  const filePath = pathOf(token, part);
  try {
    const [{ size, mtime }, name] = await Promise.all([
      stat(filePath),
      readFile(pathOf(token, 'name'), 'utf8'),
    ]);
    return { token, name, bytes: size, sentAt: mtime, open: () => fileBytes(filePath) };
  } catch (error) {
    if (isMissing(error)) return null;
    throw error;
  }
}

async function dropStaleFiles(): Promise<void> {
  for (const entry of await readdir(folder())) {
    const filePath = path.join(folder(), entry);
    const found = await stat(filePath).catch(() => null);
    if (found !== null && Date.now() - found.mtimeMs > KEPT_MS) await rm(filePath, { force: true });
  }
}

/** The last part of whatever name was sent, without control characters. */
export function plainName(name: string): string {
  const last = name.split(/[\\/]/).at(-1) ?? '';
  const plain = [...last]
    .filter((c) => c >= ' ' && c !== '\u007f')
    .join('')
    .trim()
    .slice(0, 200);
  return plain === '' || plain === '.' || plain === '..' ? 'unnamed file' : plain;
}

function isMissing(error: unknown): boolean {
  return error instanceof Error && 'code' in error && error.code === 'ENOENT';
}
