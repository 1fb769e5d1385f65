import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { getPool } from '@/lib/database/client';
import { checkFile } from '@/lib/maps/file-check';
import { freshDatabase, type FreshDatabase } from '../support/fresh-database';
import { actor, casesOf, fileText, newStream, rowCounts, settleLimits, wafer } from '../support/store-line';
import { batchOf, source, take } from '../support/store-file';

let database: FreshDatabase;
let stream: { id: string; slug: string };

beforeAll(async () => {
  database = await freshDatabase();
  stream = await newStream();
  await settleLimits(stream.id);
});

afterAll(() => database.drop());

/** Wafers of the next hours that no test has used yet, as a file. */
let used = 0;
function freshText(count: number, edit: (lines: string[]) => void = () => undefined): string {
  const lines = fileText(
    stream.slug,
    Array.from({ length: count }, () => wafer(stream.id, (used += 1))),
  ).split('\n');
  edit(lines);
  return lines.join('\n');
}

describe('a sound file', () => {
  it('is recorded, and taken again records nothing', async () => {
    const text = freshText(5);
    const first = await take(text);
    expect(first).toMatchObject({ recorded: 5, repeated: 0, refused: 0, refusals: [], notices: [] });
    const counts = await rowCounts();
    const again = await take(text, {}, 7);
    expect(again).toMatchObject({ recorded: 0, repeated: 5, refused: 0 });
    expect(await rowCounts()).toEqual(counts);
    expect(await batchOf(first.batchId)).toEqual({
      recorded: 5,
      repeated: 0,
      refused: 0,
      history: false,
      source: 'monday.csv',
      finished: true,
      listed: 0,
    });
    expect(await batchOf(again.batchId)).toMatchObject({ recorded: 0, repeated: 5, finished: true });
  });

  it('that is only checked leaves no trace', async () => {
    const text = freshText(3);
    const counts = await rowCounts();
    const batches = async () => (await getPool().query('SELECT count(*) FROM intake_batch')).rows;
    const before = await batches();
    const result = await take(text, { checkOnly: true });
    expect(result).toMatchObject({
      batchId: null,
      recorded: 0,
      repeated: 0,
      refused: 0,
      notices: ['3 measurements could be recorded'],
    });
    expect([await rowCounts(), await batches()]).toEqual([counts, before]);
    await take(text);
    expect(await take(text, { checkOnly: true })).toMatchObject({ repeated: 3 });
  });

  it('may leave words to the caller: a bare file is one wafer', async () => {
    const bare = freshText(1)
      .split('\n')
      .map((line) => line.split(',').slice(5).join())
      .join('\n');
    const defaults = { stream: stream.slug, wafer: 'bare', measured_at: '2021-03-01T00:00:00Z' };
    expect(await take(bare, { defaults })).toMatchObject({ recorded: 1 });
    expect(await take(bare)).toMatchObject({ recorded: 0, refused: 1 });
  });

  it('says which columns it does not read', async () => {
    const text = freshText(1, (lines) =>
      lines.forEach((line, i) => (lines[i] = line && `${line},${i ? 'red' : 'hue'}`)),
    );
    expect((await take(text)).notices).toEqual(['columns that are not read: hue']);
  });

  it('holds a measurement twice with the same content as one, wherever its chunks are cut', async () => {
    const text = freshText(2);
    const twice = text + text.split('\n').slice(1).join('\n');
    for (const chunk of [50, 100_000]) {
      const check = await checkFile(actor, source(twice, chunk), {}, 'record');
      expect([check.measurements, check.faulty.size, check.repeated]).toEqual([4, 0, 2]);
    }
    expect(await take(twice)).toMatchObject({ recorded: 2, repeated: 2, refused: 0 });
  });

  it('of old wafers is marked so, and opens no cases', async () => {
    const old = await newStream();
    await settleLimits(old.id);
    const text = fileText(old.slug, [wafer(old.id, 0), wafer(old.id, 1, 12)]);
    const result = await take(text, { history: true });
    expect(await batchOf(result.batchId)).toMatchObject({ recorded: 2, history: true });
    expect(await casesOf(old.id)).toEqual([]);
  });
});

describe('a file with faults', () => {
  const spoil = (lines: string[]) => (lines[12] = (lines[12] ?? '').replace(/[^,]*$/, 'oops'));

  it('records nothing as a whole, and names line and column; its refusals are kept', async () => {
    const text = freshText(3, spoil);
    const counts = await rowCounts();
    const result = await take(text);
    expect(result).toMatchObject({
      recorded: 0,
      refused: 1,
      refusals: [
        {
          file: 'monday.csv',
          line: 13,
          column: 'resistivity_ohm_cm',
          measurement: `W${String(used - 1).padStart(4, '0')}`,
        },
      ],
      notices: [expect.stringContaining('2 sound measurements were not recorded')],
    });
    expect(await rowCounts()).toEqual(counts);
    expect(await batchOf(result.batchId)).toMatchObject({
      recorded: 0,
      refused: 1,
      listed: 1,
      finished: true,
    });
  });

  it('records its sound measurements where these are asked for', async () => {
    const text = freshText(3, spoil);
    expect(await take(text, { sound: true })).toMatchObject({ recorded: 2, repeated: 0, refused: 1 });
    expect(await take(text, { sound: true })).toMatchObject({ recorded: 0, repeated: 2, refused: 1 });
  });

  it('never records half a wafer: rows that stand apart spoil each other, in whatever state they are', async () => {
    const apart = (edit: (lines: string[]) => void) =>
      freshText(2, (lines) => {
        edit(lines);
        lines.splice(15, 0, ...lines.splice(2, 3));
      });
    for (const edit of [
      () => undefined,
      (lines: string[]) => (lines[1] += 'x'),
      (lines: string[]) => (lines[3] += 'x'),
    ]) {
      const counts = await rowCounts();
      const result = await take(apart(edit), { sound: true });
      expect(result.recorded).toBe(0);
      expect(result.refusals.some(({ reason }) => reason.includes('stand apart'))).toBe(true);
      expect(await rowCounts()).toEqual(counts);
    }
  });

  it('never records a wafer of which a row is cut short', async () => {
    for (const cut of [1, 9]) {
      const text = freshText(2, (lines) => (lines[cut] = (lines[cut] ?? '').split(',').slice(0, 2).join()));
      const result = await take(text, { sound: true });
      expect(result.recorded).toBeLessThan(2);
      const { rows } = await getPool().query('SELECT FROM wafer_measurement WHERE bad_sites > 0');
      expect(rows).toEqual([]);
    }
  });

  it('refuses every copy of a measurement that contradicts itself', async () => {
    for (const order of ['same first', 'other first']) {
      const text = freshText(2);
      const body = text.split('\n').slice(1).join('\n');
      const other = body.replace(/[^,\n]*\n$/, '11\n');
      const rows = order === 'same first' ? body + other : other + body;
      expect(await take(text + rows, { sound: true })).toMatchObject({
        recorded: 1,
        repeated: 2,
        refused: 3,
      });
    }
  });

  it('with another content than on record is refused, and the record stays', async () => {
    const text = freshText(1);
    await take(text);
    const result = await take(text.replace(/[^,\n]*\n$/, '11\n'));
    expect(result).toMatchObject({ recorded: 0, refused: 1 });
    expect(result.refusals[0]).toMatchObject({ line: 2, reason: expect.stringContaining('never changed') });
  });

  it('that no one can read is refused once, with its place', async () => {
    const header = 'stream,wafer,measured_at,x_mm,y_mm,resistivity_ohm_cm\n';
    for (const [text, place] of [
      ['', { line: 1, reason: 'the file is empty' }],
      [header, { line: 1, reason: 'there are no readings below the header' }],
      ['1,2,3\n', { line: 1, column: 'x_mm' }],
      [`${header}a,"b,c\n`, { line: 2, reason: expect.stringContaining('never closed') }],
      [`${header}a\u0000`, { line: 2, reason: expect.stringContaining('binary') }],
      ['x_mm;y_mm;resistivity_ohm_cm\n0;0;1\n', { line: 1 }],
    ] as const) {
      const result = await take(text, { sound: true });
      expect(result.recorded).toBe(0);
      expect(result.refused).toBe(1);
      expect(result.refusals[0]).toMatchObject(place);
      expect(await batchOf(result.batchId)).toMatchObject({ refused: 1, listed: result.refusals.length });
    }
  });

  it('lists at most a thousand problems and says how many there are', async () => {
    const text = freshText(200, (lines) =>
      lines.forEach((line, i) => i > 0 && line && (lines[i] = `${line}x`)),
    );
    const result = await take(text);
    expect(result.refused).toBe(200);
    expect(result.refusals).toHaveLength(1000);
    expect(result.notices[0]).toBe('1800 problems in all; the first 1000 are listed');
  });
});
