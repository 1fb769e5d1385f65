import type { ClientBase } from 'pg';

/**
 * When the wafer of a stream that is furthest on was processed; null without any. What wafers are measured by (target,
 * specification, screening) changes only after it: then a wafer is measured alike whenever it is recorded, and one on
 * record, measured again, as at first.
 */
export async function newestProcessedAt(client: ClientBase, streamId: string): Promise<Date | null> {
  const { rows } = await client.query<{ newest: Date | null }>(
    'SELECT max(processed_at) AS newest FROM wafer_measurement WHERE stream_id = $1',
    [streamId],
  );
  return rows[0]?.newest ?? null;
}
