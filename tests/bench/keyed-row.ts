import type { Pool } from 'pg';

/** Commits one wafer's summary row, its values ready as text, into a copy of its table with the same keys and indexes. */
export interface KeyedRow {
  commit(waferId: string): Promise<number>;
}

/** The baseline of one wafer: a bare commit of the same single row. `commit` returns the milliseconds it took. */
export async function keyedRow(pool: Pool): Promise<KeyedRow> {
  await pool.query(`CREATE SCHEMA bare;
    CREATE TABLE bare.wafer_measurement (LIKE wafer_measurement INCLUDING ALL);
    ALTER TABLE bare.wafer_measurement ADD FOREIGN KEY (batch_id) REFERENCES public.intake_batch (id),
      ADD FOREIGN KEY (stream_id, subgroup_id) REFERENCES public.subgroup (stream_id, id)`);
  const { rows } = await pool.query<{ name: string }>(
    `SELECT column_name AS name FROM information_schema.columns
     WHERE table_schema = 'public' AND table_name = 'wafer_measurement' ORDER BY ordinal_position`,
  );
  const names = rows.map(({ name }) => name);
  const text = `INSERT INTO bare.wafer_measurement (${names.join(', ')}) VALUES (${names.map((_, i) => `$${i + 1}`).join(', ')})`;
  const asText = names.map((name) => `${name}::text`).join(', ');
  return {
    commit: async (waferId) => {
      const found = await pool.query<(string | null)[]>({
        text: `SELECT ${asText} FROM wafer_measurement WHERE id = $1`,
        values: [waferId],
        rowMode: 'array',
      });
      const start = performance.now();
      await pool.query({ name: 'keyed', text, values: found.rows[0] ?? [] });
      return performance.now() - start;
    },
  };
}
