import { randomBytes } from 'node:crypto';
import { existsSync, mkdirSync, readdirSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { readEnvironment } from '@/lib/env';
import type { ChainEnd } from './audit-entry';

/** The end of a chain as it was kept outside the database. */
export interface AuditHead {
  id: number;
  mac: Buffer;
}

/** So long a head may be put off, so that entries that follow each other fast cost one write. */
const SOON_MS = 100;

/** The newest end of each chain that waits to be kept, by its file. */
const waiting = new Map<string, ChainEnd>();
let due: NodeJS.Timeout | null = null;
let keepsAtExit = false;

/** The file that keeps the head of a chain, in the data folder. */
export function headFile(chain: string): string {
  return path.join(readEnvironment().dataFolder, `audit-head-${chain}`);
}

/**
 * Keeps the end of a chain in the data folder, once its transaction is committed, so that a cut tail shows: within a
 * tenth of a second, and before the process ends. A process that is killed before leaves the database ahead of the
 * file, never behind.
 */
export function keepHead(end: ChainEnd): void {
  const file = headFile(end.name);
  if ((waiting.get(file)?.id ?? 0) < end.id) waiting.set(file, end);
  due ??= setTimeout(keepWaitingHeads, SOON_MS).unref();
  if (!keepsAtExit) process.once('exit', keepWaitingHeads);
  keepsAtExit = true;
}

/** Writes what waits at once. A failure is said and stops nobody: what was done is done. */
export function keepWaitingHeads(): void {
  if (due !== null) clearTimeout(due);
  due = null;
  for (const [file, end] of waiting) {
    try {
      const known = readHead(file);
      if (known === null || known.id < end.id) replaceFile(file, end);
    } catch (error) {
      const reason = error instanceof Error ? error.message : String(error);
      console.warn(`The head of the audit trail could not be kept: ${reason}`);
    }
  }
  waiting.clear();
}

function replaceFile(file: string, { id, mac }: ChainEnd): void {
  const draft = `${file}.${randomBytes(6).toString('hex')}`;
  mkdirSync(path.dirname(file), { recursive: true, mode: 0o700 });
  try {
    writeFileSync(draft, `${id} ${mac.toString('hex')}\n`, { mode: 0o600, flag: 'wx' });
    renameSync(draft, file);
  } catch (error) {
    rmSync(draft, { force: true });
    throw error;
  }
}

/** The files in the data folder that keep heads of other chains than this. */
export function strangeHeads(chain: string): string[] {
  const { dir, base } = path.parse(headFile(chain));
  const names = existsSync(dir) ? readdirSync(dir) : [];
  return names.filter((name) => /^audit-head-[0-9a-f-]{36}$/.test(name) && name !== base).sort();
}

/** The head in a file; null where there is no such file or it holds none. */
export function readHead(file: string): AuditHead | null {
  const [, id, mac] = /^(\d{1,15}) ([0-9a-f]{64})\n$/.exec(textOf(file)) ?? [];
  return id === undefined || mac === undefined ? null : { id: Number(id), mac: Buffer.from(mac, 'hex') };
}

function textOf(file: string): string {
  try {
    return readFileSync(file, 'utf8');
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === 'ENOENT') return '';
    throw error;
  }
}
