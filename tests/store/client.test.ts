import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { getPool, getPrisma } from '@/lib/database/client';
import { type FreshDatabase, freshDatabase } from '../support/fresh-database';
import { runSql } from '../support/store-server';

let database: FreshDatabase;

beforeAll(async () => {
  database = await freshDatabase();
  await runSql(
    database.url,
    `alter database ${new URL(database.url).pathname.slice(1)} set timezone = 'Asia/Kathmandu'`,
  );
});

afterAll(() => database.drop());

describe('getPool', () => {
  it('gives ids as decimal strings, measurements as numbers, moments as dates, days as text', async () => {
    const { rows } = await getPool().query(
      `select 9007199254740993::int8 as id, 0.1::float8 as value, '{1,2}'::int8[] as ids, '{0.5}'::float8[] as values,
              timestamptz '2026-03-04T12:00:00+05:45' as moment, date '2026-03-04' as day`,
    );
    expect(rows).toEqual([
      {
        id: '9007199254740993',
        value: 0.1,
        ids: ['1', '2'],
        values: [0.5],
        moment: new Date('2026-03-04T06:15:00Z'),
        day: '2026-03-04',
      },
    ]);
  });
});

describe('getPrisma', () => {
  it('writes, reads and compares moments as they are, in whatever zone the server lives', async () => {
    const at = new Date('2021-04-05T06:07:08.250Z');
    const prisma = getPrisma();
    const row = await prisma.intakeBatch.create({
      data: { source: 'test', origin: 'command', actor: 'test', startedAt: at },
    });
    expect((await getPool().query('select started_at from intake_batch')).rows).toEqual([{ started_at: at }]);
    expect((await prisma.intakeBatch.findUnique({ where: { id: row.id } }))?.startedAt).toEqual(at);
    expect(await prisma.intakeBatch.count({ where: { startedAt: { gte: at, lte: at } } })).toBe(1);
  });

  it('works on the same database', async () => {
    const [row] = await getPrisma().$queryRaw<{ name: string }[]>`select current_database()::text as name`;
    expect(database.url).toContain(row?.name);
  });
});
