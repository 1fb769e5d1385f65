import type { ClientBase } from 'pg';

/** Whether each of these ids is that of a stream. */
export async function areStreams(client: ClientBase, ids: readonly string[]): Promise<boolean> {
  const { rows } = await client.query<{ strange: number }>(
    `SELECT count(*)::integer AS strange FROM unnest($1::bigint[]) AS given (id)
     WHERE NOT EXISTS (SELECT FROM stream WHERE stream.id = given.id)`,
    [ids],
  );
  return rows[0]?.strange === 0;
}
