import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { bytesOf, chunked, readFile, readText } from './wafer-file';

const reasons = async (text: string) => (await readText(text)).faults?.map(({ reason }) => reason);

describe('the header of a wafer-map file', () => {
  it('says where each column stands, whatever their order, and which are not read', async () => {
    const { header } = await readText(
      '\uFEFFy_mm, wafer ,hue,resistivity_ohm_cm,x_mm,constructor\n1,A,,3,4,\n',
    );
    expect(header).toEqual({
      x: 4,
      y: 0,
      value: 3,
      valueColumn: 'resistivity_ohm_cm',
      wafer: [{ column: 'wafer', index: 1 }],
      unread: ['hue', 'constructor'],
      width: 6,
    });
  });

  it('cannot serve without places or a value, with a column twice, or with two values that contradict each other', async () => {
    expect(await reasons('x_mm,resistivity_ohm_cm\n')).toEqual(['the header has no column y_mm']);
    expect(await reasons('x_mm,y_mm\n')).toEqual([
      'the header has neither resistivity_ohm_cm nor sheet_resistance_ohm_sq',
    ]);
    expect(await reasons('1,2,3\n4,5,6\n')).toHaveLength(3);
    const { faults } = await readText('\nx_mm,x_mm,y_mm,resistivity_ohm_cm,sheet_resistance_ohm_sq\n');
    expect(faults).toEqual([
      { line: 2, column: 'x_mm', reason: 'this column stands twice in the header' },
      { line: 2, column: 'sheet_resistance_ohm_sq', reason: expect.stringContaining('contradict') },
    ]);
  });

  it('cannot serve with raw voltages alone: no gauge is on record to correct them', async () => {
    const { faults } = await readText('x_mm,y_mm,voltage_v,current_a\n0,0,1,1\n');
    expect(faults).toMatchObject([{ line: 1, column: 'voltage_v' }]);
    expect((await readText('x_mm,y_mm,voltage_v,resistivity_ohm_cm\n0,0,1,1\n')).header?.unread).toEqual([
      'voltage_v',
    ]);
  });

  it('parted by semicolons or tabs is told so, once', async () => {
    expect(await reasons('x_mm;y_mm;resistivity_ohm_cm\n0;0;1,5\n')).toEqual([
      expect.stringContaining('semicolons'),
    ]);
    expect(await reasons('x_mm\ty_mm\tresistivity_ohm_cm\n')).toEqual([expect.stringContaining('tabs')]);
  });

  it('is missing in an empty file', async () => {
    for (const text of ['', '\uFEFF', '\n\n', '  \r\n'])
      expect(await reasons(text)).toEqual(['the file is empty']);
  });
});

describe('the rows of a wafer-map file', () => {
  const head = 'wafer,note,x_mm,y_mm,resistivity_ohm_cm\n';

  it('are gathered while they name the same measurement, spaces around a name or not', async () => {
    const { maps } = await readText(
      `${head}A,n,0,0,1\n A ,n,1,-2.5,1e1\n"A",n,.5,+3,1.\nB,n,0,0,2\nA,n,2,0,3\n`,
    );
    expect(maps.map((map) => [map.words.wafer, map.values, map.lines])).toEqual([
      ['A', [1, 10, 1], [2, 3, 4]],
      ['B', [2], [5]],
      ['A', [3], [6]],
    ]);
    expect(maps[0]).toMatchObject({ firstLine: 2, xMm: [0, 1, 0.5], yMm: [0, -2.5, 3], faults: [] });
  });

  it('know a reading that was not taken from one that is no number', async () => {
    const { maps } = await readText(`${head}A,,0,0,\nA,,1,0,NaN\nA,,2,0,-Inf\nA,,3,0, \nA,,4,0,-1\n`);
    expect(maps[0]?.values).toEqual([null, NaN, NaN, null, -1]);
    expect(maps[0]?.faults).toEqual([]);
  });

  it('name line and column of each cell that is no number; a decimal comma is none', async () => {
    const { maps } = await readText(
      `${head}A,,0,0,"1,5"\nA,,1,,2\nA,"two\nlines",0x10,0,2\nA,,NaN,0,1e999\nA,,1 2,0,--1\n`,
    );
    expect(maps[0]?.faults.map(({ line, column, reason }) => [line, column, reason])).toEqual([
      [2, 'resistivity_ohm_cm', '"1,5" is not a number'],
      [3, 'y_mm', 'a number is missing'],
      [4, 'note', expect.stringContaining('here, but ""')],
      [4, 'x_mm', '"0x10" is not a number'],
      [6, 'x_mm', '"NaN" is not a number'],
      [6, 'resistivity_ohm_cm', '"1e999" is not a number'],
      [7, 'x_mm', '"1 2" is not a number'],
      [7, 'resistivity_ohm_cm', '"--1" is not a number'],
    ]);
  });

  it('of one wafer must not contradict each other; that is told once a column', async () => {
    const { maps } = await readText(`${head}A,p,0,0,1\nA,q,1,0,1\nA,r,2,0,1\n`);
    expect(maps[0]?.faults).toEqual([
      { line: 3, column: 'note', reason: '"q" here, but "p" on the wafer\'s first row' },
    ]);
  });

  it('that do not match the header spoil the measurements on both sides: whose they are cannot be told', async () => {
    const { maps } = await readText(
      `${head}A,,0,0,1\nB,,0\nB,,1,0,1\nC,,0,0,1\nC,,1,0,1,9\nC,,2,0,1\nD,,0,0,1\n`,
    );
    const short = { line: 3, column: null, reason: 'this row has 3 cells, the header 5' };
    const long = { line: 6, column: null, reason: 'this row has 6 cells, the header 5' };
    expect(maps.map((map) => [map.words.wafer, map.faults])).toEqual([
      ['A', [short]],
      ['B', [short]],
      ['C', [long]],
      ['D', []],
    ]);
    expect((await readText(`${head}A,,0,0,1\nend of file\n`)).maps[0]?.faults).toHaveLength(1);
    expect(await reasons(`${head}A,,0\n`)).toEqual(['this row has 3 cells, the header 5']);
  });

  it('may be many faults: no more than twenty a measurement are kept', async () => {
    const { maps } = await readText(head + 'A,,x,y,z\n'.repeat(100));
    expect(maps[0]?.faults).toHaveLength(20);
    expect(maps[0]?.lines).toHaveLength(100);
  });

  it('of a file that ends in an open quote are none: the file is refused with the line of the quote', async () => {
    expect((await readText(`${head}A,,0,0,1\nA,"open,1,0,1\nA,,2,0,1\n`)).faults).toMatchObject([
      { line: 3 },
    ]);
    const long = `${head}A,,0,0,1\nA,"open,1,0,1\n${'A,,2,0,1\n'.repeat(150_000)}`;
    const chunks = chunked(
      bytesOf(long),
      Array.from({ length: 12 }, (_, i) => i * 131_072),
    );
    expect((await readFile(chunks)).faults).toMatchObject([
      { line: 3, reason: expect.stringContaining('quote') },
    ]);
  });
});

/** Cells of files that are right, nearly right and wrong, in every notation. */
const word = fc.constantFrom(
  'A',
  'A',
  'A',
  ' A',
  'B',
  '',
  '"A"',
  '"a, b"',
  'a',
  '"two\nlines"',
  '"""q"""',
  'ü',
  '4',
);
const number = fc.oneof(
  { weight: 12, arbitrary: fc.constantFrom('1', '-2.5', '1e3', '.5', '7.', ' 8') },
  { weight: 1, arbitrary: fc.constantFrom('', 'NaN', '-inf', 'x', '1,5', '"3"', '1e999') },
);
const row = fc
  .tuple(word, number, number, number, fc.constantFrom('s', 's', 's', 't', '4', '"s"'), fc.nat(40))
  .map(([wafer, x, y, value, stage, odd]) =>
    odd === 0 ? '' : odd === 1 ? `${wafer},${x}` : [wafer, x, y, value, stage].join(),
  );
/** Rows that repeat the one before them but for their numbers: what the fast way through a file is for. */
const stretch = fc
  .tuple(
    word,
    fc.constantFrom('s', 't', '4'),
    fc.array(fc.tuple(number, number, number), { minLength: 1, maxLength: 8 }),
  )
  .map(([wafer, stage, cores]) => cores.map((core) => [wafer, ...core, stage].join()));
const header = fc.constantFrom(
  'wafer,x_mm,y_mm,resistivity_ohm_cm,stage',
  'wafer,resistivity_ohm_cm,y_mm,x_mm,stage',
  'wafer,x_mm,stage,y_mm,resistivity_ohm_cm',
  'x_mm,wafer,y_mm,resistivity_ohm_cm,stage',
);
const file = fc
  .record({
    header,
    rows: fc
      .array(fc.oneof(stretch, fc.array(row, { maxLength: 3 })), { maxLength: 8 })
      .map((list) => list.flat()),
    ends: fc.array(fc.constantFrom('\n', '\n', '\r\n', '\n\n'), { minLength: 1, maxLength: 5 }),
    mark: fc.constantFrom('', '\uFEFF'),
    last: fc.constantFrom('', '', '\n', '"open', 'a"b\n'),
  })
  .map(({ header, rows, ends, mark, last }) => {
    const lines = [header, ...rows].map((line, i) => line + (ends[i % ends.length] ?? '\n'));
    return mark + lines.join('') + last;
  });

describe('reading a file', () => {
  it('makes the same of it wherever its chunks are cut', async () => {
    await fc.assert(
      fc.asyncProperty(file, fc.array(fc.nat(), { maxLength: 6 }), async (text, cuts) => {
        const bytes = bytesOf(text);
        const whole = await readFile([bytes]);
        const parts = await readFile(chunked(bytes, cuts));
        expect(parts.faults).toEqual(whole.faults);
        if (whole.faults === null) expect(parts).toEqual(whole);
      }),
      { numRuns: 600, seed: 23 },
    );
  });

  it('makes the same of it in chunks of a single byte', async () => {
    await fc.assert(
      fc.asyncProperty(file, async (text) => {
        const bytes = bytesOf(text);
        const whole = await readFile([bytes]);
        const parts = await readFile([...bytes].map((byte) => Uint8Array.of(byte)));
        expect(parts.faults).toEqual(whole.faults);
        if (whole.faults === null) expect(parts).toEqual(whole);
      }),
      { numRuns: 200, seed: 24 },
    );
  });

  it('makes the same of it by the fast way, row by row, and with every word quoted', async () => {
    await fc.assert(
      fc.asyncProperty(
        header,
        fc.array(stretch, { minLength: 1, maxLength: 6 }),
        async (header, stretches) => {
          const rows = stretches.flat().filter((line) => !line.includes('"') && line.split(',').length === 5);
          const plain = [header, ...rows].map((line) => `${line}\n`);
          // The header in a piece of its own lets all rows after it go the fast way; quotes keep every row from it.
          const fast = await readFile([bytesOf(plain[0] as string), bytesOf(plain.slice(1).join(''))]);
          const quoted = await readText(plain.map((line) => line.replace(/[^,\n]+/g, '"$&"')).join(''));
          expect(fast).toEqual(quoted);
        },
      ),
      { numRuns: 300, seed: 25 },
    );
  });

  it('never takes a row of more cells for one that repeats a quoted comma or a row of more cells', async () => {
    const head = bytesOf('wafer,x_mm,y_mm,resistivity_ohm_cm,stage\n');
    for (const [first, second] of [
      ['"a,b",1,2,3,s\n', 'a,b,1,2,3,s\n'],
      ['a,1,2,3,s,s\n', 'a,4,5,6,s,s\n'],
    ] as const) {
      const { maps, faults } = await readFile([head, bytesOf(first), bytesOf(second)]);
      expect(faults ?? maps.flatMap((map) => map.faults)).not.toEqual([]);
    }
  });
});
