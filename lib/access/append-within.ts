import type { ClientBase, PoolClient } from 'pg';
import { getPool } from '@/lib/database/client';
import { endAfter, endOf, knownChain, type EndRow } from './audit-chain';
import { linkedEntries, type ChainEnd, type LinkedEntry, type Told } from './audit-entry';
import { keepEnd } from './keep-end';
import { plantKey } from './secret';

/** After so many times that others were quicker the caller goes the way that waits. */
const MOST_TRIES = 4;

/**
 * Lets one statement, which is a transaction of its own, append the entry that tells of it, without a round trip for
 * the chain's end: the entry is linked to the end that this process knows, and the database refuses it where the chain
 * has moved on since; then it is linked anew. Within the process writers take turns. `write` must wait for nothing but
 * the chain, and answers whether what it tells of appeared, and the entry with it.
 *
 * Returns null, with nothing written, where others were quicker too often.
 */
export async function appendWithin<Result extends { appeared: boolean }>(
  told: Told,
  write: (client: ClientBase, entries: readonly LinkedEntry[]) => Promise<Result>,
): Promise<Result | null> {
  const chain = knownChain(getPool());
  // The connection before the turn: whoever has the turn waits for no connection.
  const client = await getPool().connect();
  let isBroken = false;
  try {
    const mine = chain.turn.then(() => written(client, told, write));
    chain.turn = mine.catch(() => undefined);
    return await mine;
  } catch (error) {
    isBroken = true;
    throw error;
  } finally {
    client.release(isBroken);
  }
}

async function written<Result extends { appeared: boolean }>(
  client: PoolClient,
  told: Told,
  write: (client: ClientBase, entries: readonly LinkedEntry[]) => Promise<Result>,
): Promise<Result | null> {
  let end = knownChain(getPool()).end ?? (await readEnd(client));
  for (let tries = 0; tries < MOST_TRIES; tries += 1) {
    const entries = linkedEntries(plantKey('audit'), end, [told], new Date());
    try {
      const result = await write(client, entries);
      if (result.appeared) await keepEnd(client, endAfter(end, entries));
      return result;
    } catch (error) {
      if (!isMovedOn(error)) throw error;
      end = await readEnd(client);
    }
  }
  return null;
}

async function readEnd(client: ClientBase): Promise<ChainEnd> {
  const { rows } = await client.query<EndRow>(
    `SELECT c.name, e.id, e.mac FROM audit_chain c
     LEFT JOIN LATERAL (SELECT id, mac FROM audit_entry ORDER BY id DESC LIMIT 1) e ON true`,
  );
  return endOf(rows[0] as EndRow);
}

/** The refusal of link_audit_entry. */
function isMovedOn(error: unknown): boolean {
  return error instanceof Error && 'code' in error && error.code === '40001';
}
