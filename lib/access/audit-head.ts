import { randomBytes } from 'node:crypto';
import { existsSync } from 'node:fs';
import { mkdir, readFile, rename, rm, writeFile } from 'node:fs/promises';
import path from 'node:path';
import { readEnvironment } from '@/lib/env';
import type { ChainEnd } from './audit-entry';

/** The end of a chain as it was kept outside the database. */
export interface AuditHead {
  file: string;
  id: number;
  mac: Buffer;
}

interface Keeping {
  /** The newest end that was asked to be kept. */
  wanted: ChainEnd;
  /** Runs until what is wanted is on file. */
  running: Promise<void> | null;
  /** Set while a write is put off. */
  due: NodeJS.Timeout | null;
}

/** So long a head may be put off where entries follow each other fast. */
const SOON_MS = 100;

const keepings = new Map<string, Keeping>();

/** The file that keeps the head of a chain, in the data folder. */
export function headFile(chain: string): string {
  return path.join(readEnvironment().dataFolder, `audit-head-${chain}`);
}

/**
 * Keeps the end of a chain in the data folder, once its transaction is committed, so that a cut tail shows. One write
 * at a time; of several that wait only the newest is written. A failure is said and stops nobody: what was done is
 * done, and the database may be ahead of the file, never behind.
 */
export function keepHead(end: ChainEnd): Promise<void> {
  const file = headFile(end.name);
  return written(file, wanting(file, end));
}

/** The same within a tenth of a second, for entries that may follow each other fast. */
export function keepHeadSoon(end: ChainEnd): void {
  const file = headFile(end.name);
  const keeping = wanting(file, end);
  keeping.due ??= setTimeout(() => void written(file, keeping), SOON_MS);
}

/** Resolves when no head waits to be kept. */
export async function headsKept(): Promise<void> {
  const waiting = [...keepings].filter(([, { due, running }]) => due !== null || running !== null);
  await Promise.all(waiting.map(([file, keeping]) => written(file, keeping)));
}

function wanting(file: string, end: ChainEnd): Keeping {
  const keeping = keepings.get(file) ?? { wanted: end, running: null, due: null };
  keepings.set(file, keeping);
  if (end.id >= keeping.wanted.id) keeping.wanted = end;
  return keeping;
}

function written(file: string, keeping: Keeping): Promise<void> {
  if (keeping.due !== null) clearTimeout(keeping.due);
  keeping.due = null;
  keeping.running ??= writeWanted(file, keeping);
  return keeping.running;
}

async function writeWanted(file: string, keeping: Keeping): Promise<void> {
  try {
    for (let written: ChainEnd | null = null; written !== keeping.wanted;) {
      written = keeping.wanted;
      const known = await readHead(file);
      if (known === null || known.id < written.id) await replaceFile(file, written);
    }
  } catch (error) {
    const reason = error instanceof Error ? error.message : String(error);
    console.warn(`The head of the audit trail could not be kept: ${reason}`);
  } finally {
    keeping.running = null;
  }
}

async function replaceFile(file: string, { id, mac }: ChainEnd): Promise<void> {
  const draft = `${file}.${randomBytes(6).toString('hex')}`;
  const folder = path.dirname(file);
  if (!existsSync(folder)) await mkdir(folder, { recursive: true, mode: 0o700 });
  try {
    await writeFile(draft, `${id} ${mac.toString('hex')}\n`, { mode: 0o600, flag: 'wx' });
    await rename(draft, file);
  } catch (error) {
    await rm(draft, { force: true });
    throw error;
  }
}

/** The head in a file; null where there is no such file or it holds none. */
export async function readHead(file: string): Promise<AuditHead | null> {
  const text = await readFile(file, 'utf8').catch((error: unknown) => {
    if ((error as NodeJS.ErrnoException).code === 'ENOENT') return '';
    throw error;
  });
  const [, id, mac] = /^(\d{1,15}) ([0-9a-f]{64})\n$/.exec(text) ?? [];
  return id === undefined || mac === undefined
    ? null
    : { file, id: Number(id), mac: Buffer.from(mac, 'hex') };
}
