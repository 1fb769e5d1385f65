import { finished } from 'node:stream/promises';
import type { Pool } from 'pg';
import { from as copyFrom } from 'pg-copy-streams';

const TABLES = ['wafer_measurement', 'wafer_reading'] as const;

/** Rows of the two wafer tables as the text that COPY reads. */
export type CopyText = Record<(typeof TABLES)[number], Buffer>;

/** Takes what is recorded out of the two wafer tables as ready text. */
export async function copyText(pool: Pool): Promise<CopyText> {
  const { to } = await import('pg-copy-streams');
  const client = await pool.connect();
  try {
    const text: Partial<CopyText> = {};
    for (const table of TABLES) {
      const chunks: Buffer[] = [];
      for await (const chunk of client.query(to(`COPY ${table} TO STDOUT`))) chunks.push(chunk as Buffer);
      text[table] = Buffer.concat(chunks);
    }
    return text as CopyText;
  } finally {
    client.release();
  }
}

/**
 * The baseline of every bulk figure: a bare COPY of the same rows, ready as text, into the same tables with their
 * keys, indexes and foreign keys, in one transaction. The tables are copies beside the real ones, made anew. Returns
 * the seconds it took.
 */
export async function keyedCopySeconds(pool: Pool, text: CopyText): Promise<number> {
  const client = await pool.connect();
  try {
    await client.query('DROP SCHEMA IF EXISTS bare CASCADE; CREATE SCHEMA bare');
    await client.query(`
      CREATE TABLE bare.wafer_measurement (LIKE wafer_measurement INCLUDING ALL);
      ALTER TABLE bare.wafer_measurement ADD FOREIGN KEY (stream_id) REFERENCES public.stream (id),
        ADD FOREIGN KEY (batch_id) REFERENCES public.intake_batch (id),
        ADD FOREIGN KEY (stream_id, subgroup_id) REFERENCES public.subgroup (stream_id, id);
      CREATE TABLE bare.wafer_reading (LIKE wafer_reading INCLUDING ALL);
      ALTER TABLE bare.wafer_reading ADD FOREIGN KEY (stream_id, wafer_id) REFERENCES bare.wafer_measurement (stream_id, id)`);
    await client.query('CHECKPOINT');
    const start = performance.now();
    await client.query('BEGIN');
    for (const table of TABLES) {
      const stream = client.query(copyFrom(`COPY bare.${table} FROM STDIN`));
      stream.end(text[table]);
      await finished(stream);
    }
    await client.query('COMMIT');
    return (performance.now() - start) / 1000;
  } finally {
    client.release();
  }
}
