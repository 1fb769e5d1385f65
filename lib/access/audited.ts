import type { PoolClient } from 'pg';
import { getPool } from '@/lib/database/client';
import { inTransaction } from '@/lib/database/transaction';
import type { Actor } from './actor';
import { appendEntries, learnEnd } from './audit-chain';
import type { ChainEnd, Telling, Told } from './audit-entry';
import { keepHead } from './audit-head';
import { plantKey } from './secret';

/** Tells of one thing that was done; it is written at the end of the transaction. */
export type Tell = (telling: Telling) => void;

/**
 * Runs `work` in one transaction with what it tells of in the audit trail: both are committed or neither. Every write
 * of a service room goes this way. The chain is held last, just before the commit, so that transactions wait for each
 * other there for no longer than a commit takes.
 */
export async function audited<Result>(
  actor: Actor,
  work: (client: PoolClient, tell: Tell) => Promise<Result>,
): Promise<Result> {
  plantKey('audit');
  const told: Told[] = [];
  let end: ChainEnd | null = null;
  const result = await inTransaction(async (client) => {
    const answer = await work(client, (telling) => told.push({ ...telling, actor }));
    if (told.length > 0) end = await appendEntries(client, told);
    return answer;
  }, "SET LOCAL evenohm.audited = 'on'");
  committed(end);
  return result;
}

/** What is left to do after a commit: to know the new end of the chain, if there is one, and to keep it outside. */
export function committed(end: ChainEnd | null): void {
  if (end === null) return;
  learnEnd(getPool(), end);
  keepHead(end);
}
