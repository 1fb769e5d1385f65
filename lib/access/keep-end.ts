import type { ClientBase, Pool } from 'pg';
import { getPool } from '@/lib/database/client';
import { knownChain, learnEnd } from './audit-chain';
import type { ChainEnd } from './audit-entry';
import { headFile, keepHead, readHead, type AuditHead } from './audit-head';

/**
 * Remembers where the chain ends once that is committed, here and outside the database. A head that was kept before and
 * that the database does not hold stays as it is: it is what shows that entries were cut off, or that an older database
 * was put back, also when the chain has grown past it again. It is looked for when the process keeps its first head,
 * and whenever the chain ends earlier than it knew. `on` runs the query.
 */
export async function keepEnd(on: ClientBase | Pool, end: ChainEnd): Promise<void> {
  const pool = getPool();
  const known = knownChain(pool);
  const isAsKnown = known.end?.name === end.name && known.end.id < end.id;
  learnEnd(pool, end);
  if (!known.headHolds || !isAsKnown) {
    // What was done is committed: not being able to look must not seem to undo it.
    const fault = await headFault(on, end.name).catch(() => 'it could not be looked for');
    if (fault !== null && known.headHolds !== false) {
      console.warn(`The head of the audit trail in ${headFile(end.name)} is left as it is: ${fault}.`);
    }
    known.headHolds = fault === null;
  }
  if (known.headHolds) keepHead(end);
}

/** Why the database is not one that has gone on from the head which was kept of its chain; null where it is. */
export async function headFault(on: ClientBase | Pool, chain: string): Promise<string | null> {
  const head = readHead(headFile(chain));
  return head === null || (await isHeld(on, head))
    ? null
    : `the database does not hold entry ${head.id} as it was`;
}

async function isHeld(on: ClientBase | Pool, { id, mac }: AuditHead): Promise<boolean> {
  const { rows } = await on.query<{ mac: Buffer }>('SELECT mac FROM audit_entry WHERE id = $1', [id]);
  return rows[0]?.mac.equals(mac) ?? false;
}
