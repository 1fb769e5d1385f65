import type { PoolClient } from 'pg';
import { getPool } from './client';

/**
 * Transactions of one process at once. Each holds a connection of the pool, and work within it may ask the pool for
 * another: were all connections held by such work, none would ever come free.
 */
const MOST_AT_ONCE = 10;
let running = 0;
const waiting: (() => void)[] = [];

/** Runs `work` in one transaction: committed when it returns, rolled back when it throws. */
export async function inTransaction<Result>(work: (client: PoolClient) => Promise<Result>): Promise<Result> {
  if (running >= MOST_AT_ONCE) await new Promise<void>((resolve) => waiting.push(resolve));
  else running += 1;
  try {
    return await inOwnTransaction(work);
  } finally {
    const next = waiting.shift();
    if (next === undefined) running -= 1;
    else next();
  }
}

async function inOwnTransaction<Result>(work: (client: PoolClient) => Promise<Result>): Promise<Result> {
  const client = await getPool().connect();
  try {
    await client.query('BEGIN');
    const result = await work(client);
    await client.query('COMMIT');
    return result;
  } catch (error) {
    await client.query('ROLLBACK');
    throw error;
  } finally {
    client.release();
  }
}
