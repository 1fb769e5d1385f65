import type { PoolClient } from 'pg';
import { getPool } from './client';

/**
 * Runs `work` in one transaction: committed when it returns, rolled back when it throws. All its queries go by the
 * given client: were each transaction to wait for a second connection, all could wait for each other. `setting` is a
 * SET LOCAL that begins it, `last` gives a statement that is sent along with its end.
 */
export async function inTransaction<Result>(
  work: (client: PoolClient) => Promise<Result>,
  around: { setting?: string; last?: (client: PoolClient) => Promise<string> } = {},
): Promise<Result> {
  const client = await getPool().connect();
  let isBroken = false;
  try {
    await client.query(`BEGIN; ${around.setting ?? ''}`);
    const result = await work(client);
    const last = (await around.last?.(client)) ?? '';
    await client.query(`${last}; COMMIT`);
    return result;
  } catch (error) {
    /** Where even that fails, the server has rolled back by itself and the connection is of no more use. */
    await client.query('ROLLBACK').catch(() => (isBroken = true));
    throw error;
  } finally {
    client.release(isBroken);
  }
}
