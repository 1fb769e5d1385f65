import { afterAll, beforeAll, expect, it } from 'vitest';
import { getPool } from '@/lib/database/client';
import { arrayLiteral, rowsAsQuery, type Column } from '@/lib/database/columnar';
import { freshDatabase, type FreshDatabase } from '../support/fresh-database';

interface Row {
  id: string;
  word: string | null;
  value: number | null;
  count: number | null;
  moment: Date | null;
  flag: boolean;
  values: (number | null)[];
}

const COLUMNS: readonly Column<Row>[] = [
  { name: 'id', type: 'bigint', value: (row) => row.id },
  { name: 'word', type: 'text', value: (row) => row.word },
  { name: 'value', type: 'float8', value: (row) => row.value },
  { name: 'count', type: 'integer', value: (row) => row.count },
  { name: 'moment', type: 'timestamptz', value: (row) => row.moment },
  { name: 'flag', type: 'boolean', value: (row) => row.flag },
  { name: 'values', type: 'float8[]', value: (row) => arrayLiteral(row.values) },
];

let database: FreshDatabase;
beforeAll(async () => (database = await freshDatabase()));
afterAll(() => database.drop());

async function roundTrip(rows: readonly Row[]) {
  const parameters: unknown[] = [];
  const given = rowsAsQuery(COLUMNS, rows, parameters);
  return (await getPool().query<Row>(`SELECT given.* FROM ${given} given`, parameters)).rows;
}

it('Rows come back from the database as they were given, to the last bit and millisecond', async () => {
  const blank = { word: null, value: null, count: null, moment: null, flag: false, values: [] };
  const rows: Row[] = [
    { ...blank, id: '9007199254740993' },
    {
      id: '-1',
      word: 'a "b" \\ {c},\nNULL',
      value: 0.1,
      count: -7,
      moment: new Date('2026-03-04T05:06:07.089Z'),
      flag: true,
      values: [1.5, null],
    },
    { ...blank, id: '3', word: '', value: -1e-300, count: 2 ** 31 - 1, moment: new Date('1950-01-01') },
    { ...blank, id: '4', word: 'NULL', value: NaN, moment: new Date('9999-12-31T23:59:59.999Z') },
    { ...blank, id: '5', value: -Infinity, count: 0, moment: new Date(0) },
  ];
  expect(await roundTrip(rows)).toEqual(rows);
});

it('No rows are none', async () => {
  expect(await roundTrip([])).toEqual([]);
});
