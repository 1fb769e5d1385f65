import pg from 'pg';
import { isDatabaseAway } from '@/lib/errors';

/** Advisory locks of ours, in one two-number family so that they meet nobody else's. */
const family = 69_118;
const inUse = 1;
const serving = 2;

/**
 * A connection whose only work is to say that this process is here: it shares the lock "in use", which falls with
 * the process however it ends.
 */
export interface Presence {
  client: pg.Client;
  /** Takes "serving", which only one process can hold; false where another serves already. */
  serve(): Promise<boolean>;
  /** Leaves; true where nobody else is in (and nobody comes in before the connection ends). */
  leaveAsLast(): Promise<boolean>;
}

/**
 * Enters a database. Returns null where the last process is just leaving, or the server stopped meanwhile: then
 * look for a server again.
 */
export async function enterDatabase(url: string): Promise<Presence | null> {
  const client = new pg.Client({
    connectionString: url,
    keepAlive: true,
    application_name: 'evenohm presence',
  });
  client.on('error', () => undefined);
  const lock = async (kind: string, key: number) => {
    const answer = await client.query<{ done: boolean }>(`select ${kind}($1, $2) as done`, [family, key]);
    return answer.rows[0]?.done === true;
  };
  try {
    await client.connect();
    if (!(await lock('pg_try_advisory_lock_shared', inUse))) {
      await client.end();
      return null;
    }
  } catch (error) {
    await client.end().catch(() => undefined);
    if (isDatabaseAway(error)) return null;
    throw error;
  }
  return {
    client,
    serve: () => lock('pg_try_advisory_lock', serving),
    leaveAsLast: async () => {
      await lock('pg_advisory_unlock_shared', inUse);
      return lock('pg_try_advisory_lock', inUse);
    },
  };
}
