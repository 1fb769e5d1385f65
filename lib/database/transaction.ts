import type { PoolClient } from 'pg';
import { getPool } from './client';

/**
 * Runs `work` in one transaction: committed when it returns, rolled back when it throws. All its queries go by the
 * given client: were each transaction to wait for a second connection, all could wait for each other.
 */
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
