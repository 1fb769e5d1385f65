import type { Actor } from '@/lib/access/actor';
import type { IntakeResult } from './types';
import { intakeFile } from './intake-file';
import type { SentOptions } from './schema';
import { claimWaitingFile, dropWaitingFile, keepWaitingFile } from './waiting-file';

/** A machine sends what it measured, not a history of years: that is for the command on the server itself. */
export const MOST_SENT_BYTES = 1_000_000_000;

/**
 * Takes a file that a machine or a command elsewhere sends. It is kept in the private folder meanwhile, because a file
 * is checked whole before anything of it is recorded, and thrown away whatever becomes of it.
 */
export async function takeSentFile(
  actor: Actor,
  file: { name: string; body: ReadableStream<Uint8Array>; mostBytes?: number },
  options: SentOptions,
): Promise<{ ok: true; result: IntakeResult } | { ok: false; reason: string }> {
  const kept = await keepWaitingFile(actor, file.name, file.body, file.mostBytes ?? MOST_SENT_BYTES);
  if (!kept.ok) return kept;
  try {
    const claimed = await claimWaitingFile(actor, kept.token);
    if (claimed === null) throw new Error('A file that was just sent is gone.');
    return { ok: true, result: await intakeFile(actor, claimed, { origin: 'network', ...options }) };
  } finally {
    await dropWaitingFile(actor, kept.token);
  }
}
