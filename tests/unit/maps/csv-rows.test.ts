import { describe, expect, it } from 'vitest';
import { csvPieces, csvRows } from '@/lib/maps/csv-rows';
import { UnreadableFile } from '@/lib/maps/unreadable-file';
import { bytesOf } from './wafer-file';

function rowsOf(text: string, firstLine = 1) {
  const rows: [number, string[]][] = [];
  const nextLine = csvRows(text, firstLine, (cells, line) => rows.push([line, cells]));
  return { rows, nextLine };
}

function faultOf(text: string) {
  try {
    csvRows(text, 1, () => undefined);
  } catch (error) {
    if (error instanceof UnreadableFile) return error.faults[0];
    throw error;
  }
  return null;
}

async function piecesOf(...chunks: (string | Uint8Array)[]) {
  const pieces: string[] = [];
  const bytes = chunks.map((chunk) => (typeof chunk === 'string' ? bytesOf(chunk) : chunk));
  for await (const piece of csvPieces(bytes)) pieces.push(piece);
  return pieces;
}

describe('csvRows', () => {
  it('reads bare and quoted cells, doubled quotes, commas and line ends in quotes', () => {
    expect(rowsOf('a,"b, c"\r\n')).toEqual({ rows: [[1, ['a', 'b, c']]], nextLine: 2 });
    expect(rowsOf('"a ""b""",""\n"",x').rows).toEqual([
      [1, ['a "b"', '']],
      [2, ['', 'x']],
    ]);
    expect(rowsOf('"a\r\nb",c\r\nd,e\r\n', 7)).toEqual({
      rows: [
        [7, ['a\r\nb', 'c']],
        [9, ['d', 'e']],
      ],
      nextLine: 10,
    });
  });

  it('takes lines that end with LF and with CR LF in one file alike, and a last line without an end', () => {
    const cells = [
      [1, ['a', 'b']],
      [2, ['c', 'd']],
      [3, ['e', 'f']],
    ];
    for (const text of [
      'a,b\r\nc,d\ne,f',
      'a,b\nc,d\r\ne,f\r\n',
      'a,"b"\r\n"c",d\ne,"f"',
      'a,"b"\nc,"d"\r\ne,"f"\r',
    ])
      expect(rowsOf(text).rows).toEqual(cells);
  });

  it('passes over blank lines and counts them', () => {
    expect(rowsOf('\n\r\n  \na,b\n\n"c",d\n\n').rows).toEqual([
      [4, ['a', 'b']],
      [6, ['c', 'd']],
    ]);
    expect(rowsOf('a,\n,').rows).toEqual([
      [1, ['a', '']],
      [2, ['', '']],
    ]);
    expect(rowsOf('').rows).toEqual([]);
  });

  it('names the line of a quote that is never closed, or followed by more, or within a bare cell', () => {
    expect(faultOf('a,b\n"c\nd",e\nf,"g\nh,i\n')).toMatchObject({
      line: 4,
      reason: expect.stringContaining('never closed'),
    });
    expect(faultOf('a,b\n"c"d,e\n')).toMatchObject({
      line: 2,
      reason: expect.stringContaining('more follows'),
    });
    expect(faultOf('a,b\n\n5" wafer,e\n')).toMatchObject({
      line: 3,
      reason: expect.stringContaining('within a bare cell'),
    });
    expect(faultOf('a,"b" ,c\n')).toMatchObject({ line: 1 });
  });

  it('hands over the rows before a fault', () => {
    const rows: string[][] = [];
    expect(() => csvRows('a,b\nc,d\n"e', 1, (cells) => rows.push(cells))).toThrow(UnreadableFile);
    expect(rows).toEqual([
      ['a', 'b'],
      ['c', 'd'],
    ]);
  });
});

describe('csvPieces', () => {
  it('cuts text behind whole records only', async () => {
    expect(await piecesOf('a,b\nc', ',d\n"e\n', 'f",g\n', 'h')).toEqual([
      'a,b\n',
      'c,d\n',
      '"e\nf",g\n',
      'h',
    ]);
    expect(await piecesOf()).toEqual([]);
    expect(await piecesOf('', 'a', '')).toEqual(['a']);
  });

  it('reads chunks that come in the same memory one after another', async () => {
    const memory = new Uint8Array(3);
    const chunks = (function* () {
      for (const text of ['a,b', '\nc,', 'd\ne']) {
        memory.set(bytesOf(text));
        yield memory;
      }
    })();
    let text = '';
    for await (const piece of csvPieces(chunks)) text += piece;
    expect(text).toBe('a,b\nc,d\ne');
  });

  it('drops a byte-order mark and joins characters that a chunk cuts in two', async () => {
    const bytes = bytesOf('\uFEFFµΩ\n');
    const single = [...bytes].map((byte) => Uint8Array.of(byte));
    expect((await piecesOf(...single)).join('')).toBe('µΩ\n');
  });

  it('names the line of what is not text', async () => {
    const lineOf = async (...chunks: (string | Uint8Array)[]) => {
      const error: unknown = await piecesOf(...chunks).catch((thrown: unknown) => thrown);
      return error instanceof UnreadableFile ? error.faults[0]?.line : null;
    };
    expect(await lineOf('a\nb\n', 'c\nd', Uint8Array.of(0x65, 0x0a, 0x66, 0xb5, 0x0a))).toBe(5);
    expect(await lineOf('a\nb', Uint8Array.of(0x0a, 0, 0x0a))).toBe(3);
    expect(await lineOf('a\n', Uint8Array.of(0xc2))).toBe(2);
  });

  it('refuses what is not text', async () => {
    await expect(piecesOf('a,b\n', Uint8Array.of(1, 0, 2))).rejects.toThrow('binary file');
    await expect(piecesOf('a,', Uint8Array.of(0xb5), '\n')).rejects.toThrow('not text in UTF-8');
    await expect(piecesOf(Uint8Array.of(0xc2))).rejects.toThrow('not text in UTF-8');
  });

  it('refuses a row of more than a megabyte instead of holding it', async () => {
    const chunk = 'x'.repeat(1 << 18);
    let read = 0;
    const endless = (function* () {
      for (; read < 1000; read += 1) yield bytesOf(chunk);
    })();
    const pieces = async () => {
      for await (const piece of csvPieces(endless)) expect(piece.length).toBeLessThan(1 << 21);
    };
    await expect(pieces()).rejects.toThrow('longer than a megabyte');
    expect(read).toBeLessThan(8);
  });
});
