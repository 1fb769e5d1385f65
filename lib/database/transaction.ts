import type { PoolClient } from 'pg';
import { getPool } from './client';

/** Runs `work` in one transaction: committed when it returns, rolled back when it throws. */
export async function inTransaction<Result>(work: (client: PoolClient) => Promise<Result>): Promise<Result> {
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
