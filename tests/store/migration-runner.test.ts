import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import pg from 'pg';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { applyMigrations } from '@/lib/database/migration-runner';
import { type FreshDatabase, emptyDatabase } from '../support/fresh-database';

let database: FreshDatabase;
let folder: string;

beforeEach(async () => {
  database = await emptyDatabase();
  folder = mkdtempSync(path.join(tmpdir(), 'evenohm-migrations-'));
  write('0001_furnace', 'create table furnace (id bigint primary key); insert into furnace values (1);');
});

afterEach(async () => {
  rmSync(folder, { recursive: true });
  await database.drop();
});

describe('applyMigrations', () => {
  it('applies what is new, in order, and nothing the second time', async () => {
    expect(await applyMigrations(database.url, folder)).toEqual(['0001_furnace']);
    write('0003_third', 'alter table furnace add tubes int');
    write('0002_second', 'alter table furnace add name text');
    expect(await applyMigrations(database.url, folder)).toEqual(['0002_second', '0003_third']);
    expect(await applyMigrations(database.url, folder)).toEqual([]);
  });

  it('goes by the whole name where two bear one number', async () => {
    write('0002_pumps', 'alter table furnace add pumps int');
    write('0002_lines', 'alter table furnace add lines int');
    expect(await applyMigrations(database.url, folder)).toEqual(['0001_furnace', '0002_lines', '0002_pumps']);
  });

  it('lets several instances start together: one applies, none fails', async () => {
    const results = await Promise.all(Array.from({ length: 6 }, () => applyMigrations(database.url, folder)));
    expect(results.flat()).toEqual(['0001_furnace']);
    expect(await query('select count(*)::int as n from furnace')).toEqual([{ n: 1 }]);
  });

  it('refuses a migration that was edited after it landed, and changes nothing', async () => {
    await applyMigrations(database.url, folder);
    write('0001_furnace', 'create table furnace (id int)');
    write('0002_second', 'drop table furnace');
    await expect(applyMigrations(database.url, folder)).rejects.toThrow(/0001_furnace was edited/);
    expect(await query('select id from furnace')).toEqual([{ id: '1' }]);
  });

  it('refuses a database that holds a migration which is missing here', async () => {
    write('0002_second', 'alter table furnace add name text');
    await applyMigrations(database.url, folder);
    rmSync(path.join(folder, '0002_second'), { recursive: true });
    await expect(applyMigrations(database.url, folder)).rejects.toThrow(/0002_second, which is missing/);
  });

  it('undoes a migration that fails half-way, and applies it whole once it is mended', async () => {
    write('0002_second', 'alter table furnace add name text; select no_such_function();');
    await expect(applyMigrations(database.url, folder)).rejects.toThrow(/0002_second failed and was undone/);
    write('0002_second', 'alter table furnace add name text');
    expect(await applyMigrations(database.url, folder)).toEqual(['0002_second']);
  });

  it('refuses a database with tables of another program', async () => {
    await query('create table payroll (id int)');
    await expect(applyMigrations(database.url, folder)).rejects.toThrow(/tables of another program/);
    expect(await query(`select to_regclass('furnace') as t`)).toEqual([{ t: null }]);
  });

  it('applies the migrations of this project to an empty database', async () => {
    expect((await applyMigrations(database.url)).length).toBeGreaterThan(0);
    expect(await applyMigrations(database.url)).toEqual([]);
  });
});

function write(name: string, sql: string): void {
  mkdirSync(path.join(folder, name), { recursive: true });
  writeFileSync(path.join(folder, name, 'migration.sql'), sql);
}

async function query(sql: string): Promise<unknown[]> {
  const client = new pg.Client({ connectionString: database.url });
  await client.connect();
  const { rows } = await client.query(sql);
  await client.end();
  return rows;
}
