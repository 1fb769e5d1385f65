import type { PoolClient } from 'pg';
import { getPool } from '@/lib/database/client';
import { inTransaction } from '@/lib/database/transaction';
import type { Actor } from './actor';
import { appending } from './audit-chain';
import type { ChainEnd, Telling, Told } from './audit-entry';
import { keepEnd } from './keep-end';
import { plantKey } from './secret';

/** Tells of one thing that was done; it is written at the end of the transaction. */
export type Tell = (telling: Telling) => void;

/**
 * Runs `work` in one transaction with what it tells of in the audit trail: both are committed or neither. Every write
 * of a service room goes this way. The chain is held last, just before the commit, so that transactions wait for each
 * other there for no longer than a commit takes.
 */
export function audited<Result>(
  actor: Actor,
  work: (client: PoolClient, tell: Tell) => Promise<Result>,
): Promise<Result> {
  return chained((client, tell) => work(client, (telling) => tell({ ...telling, actor })));
}

/** The same for what several did. */
export async function chained<Result>(
  work: (client: PoolClient, tell: (told: Told) => void) => Promise<Result>,
): Promise<Result> {
  plantKey('audit');
  const told: Told[] = [];
  const newEnd: { end: ChainEnd | null } = { end: null };
  const result = await inTransaction((client) => work(client, (one) => told.push(one)), {
    setting: "SET LOCAL evenohm.audited = 'on'",
    last: async (client) => {
      if (told.length === 0) return '';
      const { statement, end } = await appending(client, told);
      newEnd.end = end;
      return statement;
    },
  });
  if (newEnd.end !== null) await keepEnd(getPool(), newEnd.end);
  return result;
}
