import { readFile } from 'node:fs/promises';
import Papa from 'papaparse';

/** Why a file was refused, at a place a person can go to. Lines and columns are counted from 1. */
export interface FileFault {
  file: string;
  line: number;
  column: number;
  reason: string;
}

/** The text of one cell with its place. */
export interface Cell {
  text: string;
  line: number;
  column: number;
}

/** The asked-for columns of each row, or the faults that keep the file from being read. */
export type Columns = { ok: true; rows: Cell[][] } | { ok: false; faults: FileFault[] };

/**
 * Reads the named columns of a CSV file with a header row (RFC 4180, UTF-8, a byte-order mark is passed over).
 * Blank lines are skipped. A column that is missing or there twice, a row with too few or too many cells, a quote
 * that never closes, an empty or a binary file are faults. Rejects when the file cannot be read.
 */
export async function readColumns(file: string, names: readonly string[]): Promise<Columns> {
  const text = (await readFile(file, 'utf8')).replace(/^\uFEFF/, '');
  const fault = (line: number, column: number, reason: string): FileFault => ({ file, line, column, reason });
  if (text.includes('\u0000')) return { ok: false, faults: [fault(1, 1, 'not a text file')] };
  const { lines, faults } = parse(text, fault);
  const [header, ...body] = lines;
  if (!header) return { ok: false, faults: [fault(1, 1, 'the file is empty: it needs a header row')] };
  const titles = header.cells.map((title) => title.trim());
  const places = names.map((name) => titles.indexOf(name));
  names.forEach((name, i) => {
    const place = places[i] ?? -1;
    if (place < 0) faults.push(fault(header.line, 1, `no column "${name}"; there is ${titles.join(', ')}`));
    else if (titles.lastIndexOf(name) !== place) {
      faults.push(fault(header.line, titles.lastIndexOf(name) + 1, `column "${name}" is there twice`));
    }
  });
  for (const { cells, line } of body) {
    if (cells.length === titles.length) continue;
    const column = Math.min(cells.length, titles.length) + 1;
    faults.push(fault(line, column, `${cells.length} cells where the header has ${titles.length}`));
  }
  if (faults.length > 0) return { ok: false, faults };
  const rows = body.map(({ cells, line }) =>
    places.map((place): Cell => ({ text: (cells[place] ?? '').trim(), line, column: place + 1 })),
  );
  return { ok: true, rows };
}

interface Line {
  cells: string[];
  line: number;
}

/** All rows that are not blank, each with the line it begins on: a quoted cell may run over several. */
function parse(text: string, fault: (line: number, column: number, reason: string) => FileFault) {
  const lines: Line[] = [];
  const faults: FileFault[] = [];
  let line = 1;
  let from = 0;
  Papa.parse<string[]>(text, {
    delimiter: ',',
    step: ({ data, errors, meta }) => {
      for (const error of errors) faults.push(fault(line, 1, error.message));
      if (data.length > 1 || data[0]?.trim() !== '') lines.push({ cells: data, line });
      line += (text.slice(from, meta.cursor).match(/\r\n|\n|\r/g) ?? []).length;
      from = meta.cursor;
    },
  });
  return { lines, faults };
}
