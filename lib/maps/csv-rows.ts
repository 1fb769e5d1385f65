import Papa from 'papaparse';

/** Some rows of a CSV file that follow each other; `lines[i]` is the line on which row i begins, counted from 1. */
export interface CsvRows {
  rows: string[][];
  lines: number[];
}

/** The file cannot be read as CSV text at all. */
export class UnreadableFile extends Error {
  readonly line: number | null;

  constructor(reason: string, line: number | null = null) {
    super(reason);
    this.line = line;
  }
}

const LONGEST_RECORD = 1 << 20;

/**
 * The text of a CSV file (UTF-8) in pieces that hold whole records: the file is never held whole. Throws
 * `UnreadableFile` for a binary file, text that is not UTF-8 and a record of more than a megabyte.
 */
export async function* csvPieces(bytes: AsyncIterable<Uint8Array>): AsyncGenerator<string> {
  const decoder = new TextDecoder('utf-8', { fatal: true });
  const decoded = (chunk?: Uint8Array) => {
    try {
      return chunk === undefined ? decoder.decode() : decoder.decode(chunk, { stream: true });
    } catch {
      throw new UnreadableFile('this is not text in UTF-8');
    }
  };
  let rest = '';
  for await (const chunk of bytes) {
    if (chunk.includes(0)) throw new UnreadableFile('this is a binary file, not text');
    rest += decoded(chunk);
    const end = lastRecordEnd(rest);
    if (end === 0 && rest.length > LONGEST_RECORD) {
      throw new UnreadableFile('a record is longer than a megabyte: an open quote?');
    }
    if (end > 0) yield rest.slice(0, end);
    rest = rest.slice(end);
  }
  rest += decoded();
  if (rest !== '') yield rest;
}

/** Where the last whole record of the text ends: behind the last line end outside quotes. */
function lastRecordEnd(text: string): number {
  if (!text.includes('"')) return text.lastIndexOf('\n') + 1;
  let quoted = false;
  let end = 0;
  for (let i = 0; i < text.length; i += 1) {
    const code = text.charCodeAt(i);
    if (code === 34) quoted = !quoted;
    else if (code === 10 && !quoted) end = i + 1;
  }
  return end;
}

/**
 * The rows of a piece of CSV text (RFC 4180) that begins on `firstLine`, blank lines passed over, and the line on which
 * the next piece begins. Throws `UnreadableFile` for quotes that do not match.
 */
export function csvRows(text: string, firstLine: number): CsvRows & { nextLine: number } {
  const { data, errors } = Papa.parse<string[]>(text, { delimiter: ',' });
  const error = errors.find((e) => e.type === 'Quotes');
  const quoted = text.includes('"');
  const rows: string[][] = [];
  const lines: number[] = [];
  let line = firstLine;
  data.forEach((row, index) => {
    if (error && error.row === index)
      throw new UnreadableFile(`quotes that do not match: ${error.message}`, line);
    if (index === data.length - 1 && row.length === 1 && row[0] === '') return;
    if (row.length > 1 || row[0] !== '') {
      rows.push(row);
      lines.push(line);
    }
    line += 1;
    if (quoted) for (const cell of row) line += cell.split('\n').length - 1;
  });
  return { rows, lines, nextLine: line };
}
