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
 * The rows of a CSV file (RFC 4180, UTF-8) in the order of the file, some at a time: the file is never held whole.
 * Blank lines are passed over. Throws `UnreadableFile` for an empty or binary file, text that is not UTF-8, a quote
 * that never closes and a record of more than a megabyte.
 */
export async function* csvRows(bytes: AsyncIterable<Uint8Array>): AsyncGenerator<CsvRows> {
  const decoder = new TextDecoder('utf-8', { fatal: true });
  let rest = '';
  let line = 1;
  let any = false;
  const decoded = (chunk?: Uint8Array) => {
    try {
      return chunk === undefined ? decoder.decode() : decoder.decode(chunk, { stream: true });
    } catch {
      throw new UnreadableFile('this is not text in UTF-8', line);
    }
  };
  for await (const chunk of bytes) {
    if (chunk.includes(0)) throw new UnreadableFile('this is a binary file, not text', line);
    rest += decoded(chunk);
    const end = lastRecordEnd(rest);
    if (end === 0) {
      if (rest.length > LONGEST_RECORD)
        throw new UnreadableFile('a record longer than a megabyte: an open quote?', line);
      continue;
    }
    const parsed = parsedRows(rest.slice(0, end), line);
    line = parsed.nextLine;
    rest = rest.slice(end);
    any ||= parsed.rows.length > 0;
    if (parsed.rows.length > 0) yield parsed;
  }
  rest += decoded();
  const parsed = parsedRows(rest, line);
  if (parsed.rows.length > 0) yield parsed;
  else if (!any) throw new UnreadableFile('the file is empty');
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

function parsedRows(text: string, firstLine: number): CsvRows & { nextLine: number } {
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
