import type { ClientBase, Pool } from 'pg';

type Table = 'wafer_measurement' | 'subgroup' | 'intake_batch' | 'signal' | 'excursion' | 'limit_revision';

const stocks = new WeakMap<Pool, Map<Table, string[]>>();
const AT_ONCE = 64;

/**
 * Fresh ids from a table's own sequence, handed out before the rows are written so that one statement can write rows
 * that refer to each other. A small stock is kept per process, so that one wafer needs no round trip for its ids;
 * what is left of it when the process ends is a gap in the numbers and nothing else. Within a transaction `by` is its
 * client.
 */
export async function takeIds(
  pool: Pool,
  table: Table,
  count: number,
  by: ClientBase | Pool = pool,
): Promise<string[]> {
  const ofPool = stocks.get(pool) ?? new Map<Table, string[]>();
  stocks.set(pool, ofPool);
  const stock = ofPool.get(table) ?? [];
  ofPool.set(table, stock);
  if (stock.length < count) {
    const { rows } = await by.query<{ id: string }>(
      `SELECT nextval(pg_get_serial_sequence($1, 'id')) AS id FROM generate_series(1, $2::integer)`,
      [table, Math.max(AT_ONCE, count - stock.length)],
    );
    for (const row of rows) stock.push(row.id);
  }
  return stock.splice(0, count);
}
