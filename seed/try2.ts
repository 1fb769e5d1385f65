import { openDatabase } from '@/lib/database/connection';
import { getPool } from '@/lib/database/client';
import pg from 'pg';
const db = await openDatabase({ say: console.log });
const orig = pg.Client.prototype.query as any;
(pg.Client.prototype as any).query = async function (this: any, c: any, ...rest: any[]) {
  if (c && c.name === 'record' && !process.env.NOEX) {
    const t = performance.now();
    const r = await orig.call(this, {
      text: 'EXPLAIN (ANALYZE, BUFFERS OFF, TIMING ON) ' + c.text,
      values: c.values,
    });
    if ((globalThis as any).n++ > 3) {
      console.log(r.rows.map((x: any) => x['QUERY PLAN']).join('\n'));
      process.exit();
    }
    return { rows: [{ streams: new Set(c.values[0]).size }] };
  }
  return orig.call(this, c, ...rest);
};
(globalThis as any).n = 0;
const { seedDemo } = await import('./seed-demo');
await seedDemo(console.log);
await db.close();
