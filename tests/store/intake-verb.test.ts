import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, afterEach, beforeAll, describe, expect, it, vi } from 'vitest';
import { intake } from '@/lib/command/verbs/intake';
import { openClients } from '@/lib/database/client';
import { freshDatabase, type FreshDatabase } from '../support/fresh-database';
import { fileText, newStream, settleLimits, wafer } from '../support/store-line';

let database: FreshDatabase;
let folder = '';
let stream: { id: string; slug: string };

beforeAll(async () => {
  database = await freshDatabase();
  stream = await newStream();
  await settleLimits(stream.id);
  folder = await mkdtemp(join(tmpdir(), 'intake-store-'));
});

afterEach(() => vi.unstubAllEnvs());

afterAll(async () => {
  await rm(folder, { recursive: true });
  openClients(database.url);
  await database.drop();
});

async function run(files: Record<string, string>, ...flags: string[]) {
  vi.stubEnv('DATABASE_URL', database.url);
  const paths = Object.keys(files).map((name) => join(folder, name));
  for (const [name, text] of Object.entries(files)) await writeFile(join(folder, name), text);
  const out: string[] = [];
  const said: string[] = [];
  const exit = await intake.run([...paths, ...flags], { out: (t) => out.push(t), say: (t) => said.push(t) });
  return { exit, out, said };
}

describe('intake', () => {
  it('records files and prints one JSON object, and the same files again as repeated', async () => {
    const files = {
      'a.csv': fileText(stream.slug, [wafer(stream.id, 0), wafer(stream.id, 1)]),
      'b.csv': fileText(stream.slug, [wafer(stream.id, 2)]),
    };
    const first = await run(files, '--json');
    expect(first.exit).toBe(0);
    expect(first.out.map((text) => JSON.parse(text) as unknown)).toEqual([
      { recorded: 3, repeated: 0, refused: 0, refusals: [], notices: [] },
    ]);
    expect(await run(files)).toEqual({ exit: 0, out: ['0 recorded, 3 repeated, 0 refused.'], said: [] });
  });

  it('ends with 3 where something is refused, and names file, line and column', async () => {
    const text = fileText(stream.slug, [wafer(stream.id, 3), wafer(stream.id, 4)]).replace(
      /[^,\n]*\n$/,
      'oops\n',
    );
    const { exit, out, said } = await run({ 'c.csv': text }, '--json', '--sound');
    expect(exit).toBe(3);
    expect(JSON.parse(out.join('\n'))).toEqual({
      recorded: 1,
      repeated: 0,
      refused: 1,
      refusals: [
        {
          file: join(folder, 'c.csv'),
          line: 19,
          column: 'resistivity_ohm_cm',
          measurement: 'W0004',
          reason: '"oops" is not a number',
        },
      ],
      notices: [],
    });
    expect(said).toEqual([]);
    expect((await run({ 'c.csv': text })).said.at(-1)).toMatch(
      /c\.csv, line 19, column resistivity_ohm_cm: W0004: "oops"/,
    );
  });

  it('only checks where that is asked for', async () => {
    const text = fileText(stream.slug, [wafer(stream.id, 9)]);
    expect(await run({ 'd.csv': text }, '--check')).toEqual({
      exit: 0,
      out: ['0 recorded, 0 repeated, 0 refused. Nothing was recorded: this was a check.'],
      said: ['1 measurement could be recorded.'],
    });
    expect((await run({ 'd.csv': text })).out[0]).toContain('1 recorded');
  });

  it('takes from its flags what a bare file does not say', async () => {
    const bare = fileText(stream.slug, [wafer(stream.id, 0)]).replace(/^([^,\n]*,){5}/gm, '');
    expect((await run({ 'e.csv': bare })).exit).toBe(3);
    const flags = [
      '--stream',
      stream.slug,
      '--wafer',
      'X',
      '--measured-at',
      '2021-05-01T00:00:00+02:00',
      '--history',
    ];
    expect((await run({ 'e.csv': bare }, ...flags)).out[0]).toContain('1 recorded');
  });
});
