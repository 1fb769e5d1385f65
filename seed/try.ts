import { openDatabase } from '@/lib/database/connection';
import { getPool } from '@/lib/database/client';
import { seedDemo } from './seed-demo';
const db = await openDatabase({ say: console.log });
const t = performance.now();
if (process.argv[2]) console.log(await seedDemo(console.log), 'in', (performance.now() - t) / 1000);
const q = async (sql: string) => console.table((await getPool().query(sql)).rows);
await q(
  `select s.slug, s.subgroup, count(*) n, sum((g.state='judged')::int) judged, sum((g.level is null)::int) notj, round(avg(g.level)::numeric,3) lev, round(avg(g.within)::numeric,3) wi, (select count(*) from signal x where x.stream_id=s.id and withdrawn_at is null) signals, (select count(*) from excursion x where x.stream_id=s.id) exc, (select count(*) from wafer_measurement w where w.stream_id=s.id) wafers from stream s join subgroup g on g.stream_id=s.id group by s.id, s.slug, s.subgroup order by 1`,
);
await q(
  `select s.slug, x.chart, x.rule, x.side, x.completions c, g.position_at, (select count(*) from subgroup h where h.stream_id=g.stream_id and (h.position_at,h.key) <= (g.position_at,g.key)) nth from signal x join stream s on s.id=x.stream_id join subgroup g on g.id=x.first_subgroup_id where withdrawn_at is null order by 1,6`,
);
await db.close();
