import { isUtf8 } from 'node:buffer';
import { unreadable } from './unreadable-file';

const LONGEST_RECORD = 1 << 20;

/**
 * The text of a CSV file (UTF-8) in pieces that hold whole records: the file is never held whole. Throws
 * `UnreadableFile` for a binary file, text that is not UTF-8 and a record of more than a megabyte; that record is the
 * last piece, so that its reader may find what is wrong with it first. A chunk's memory may be used again for the next.
 */
export async function* csvPieces(
  chunks: Iterable<Uint8Array> | AsyncIterable<Uint8Array>,
): AsyncGenerator<string> {
  let line = 1;
  let rest: Uint8Array = new Uint8Array(0);
  let isFirst = true;
  const textOf = (piece: Uint8Array): string => {
    const text = Buffer.from(piece.buffer, piece.byteOffset, piece.byteLength).toString();
    if (!isUtf8(piece)) {
      const before = text.slice(0, text.indexOf('\uFFFD'));
      throw unreadable('this is not text in UTF-8', line + before.split('\n').length - 1);
    }
    const hasMark = isFirst && text.startsWith('\uFEFF');
    isFirst = false;
    return hasMark ? text.slice(1) : text;
  };
  for await (const chunk of chunks) {
    const zero = chunk.indexOf(0);
    if (zero !== -1)
      throw unreadable(
        'this is a binary file, not text',
        line + lineEnds(rest) + lineEnds(chunk.subarray(0, zero)),
      );
    const bytes = rest.length === 0 ? chunk : Buffer.concat([rest, chunk]);
    const end = lastRecordEnd(bytes);
    // A copy: the chunk's memory may hold the next one by then.
    rest = Uint8Array.from(bytes.subarray(end));
    if (end === 0 && rest.length > LONGEST_RECORD) {
      yield Buffer.from(rest).toString();
      throw unreadable('a row is longer than a megabyte', line);
    }
    if (end === 0) continue;
    const piece = bytes.subarray(0, end);
    const ends = lineEnds(piece);
    yield textOf(piece);
    line += ends;
  }
  const last = textOf(rest);
  if (last !== '') yield last;
}

function lineEnds(bytes: Uint8Array): number {
  let count = 0;
  for (let at = bytes.indexOf(10); at !== -1; at = bytes.indexOf(10, at + 1)) count += 1;
  return count;
}

/** Where the last whole record of the bytes ends: behind the last line end outside quotes. */
function lastRecordEnd(bytes: Uint8Array): number {
  if (!bytes.includes(34)) return bytes.lastIndexOf(10) + 1;
  let quoted = false;
  let end = 0;
  for (let i = 0; i < bytes.length; i += 1) {
    const code = bytes[i];
    if (code === 34) quoted = !quoted;
    else if (code === 10 && !quoted) end = i + 1;
  }
  return end;
}

/**
 * Hands over the rows of a piece of CSV text (RFC 4180, lines that end with CR LF or LF alone) that begins on
 * `firstLine`, each with the line on which it begins, blank lines passed over. Returns the line on which the next piece
 * begins. Throws `UnreadableFile` for quotes that do not match, after the rows before them.
 *
 * @example csvRows('a,"b, c"\r\n', 1, onRow) // onRow(['a', 'b, c'], 1), and 2 comes back
 */
export function csvRows(
  text: string,
  firstLine: number,
  onRow: (cells: string[], line: number) => void,
): number {
  let line = firstLine;
  for (let position = 0; position < text.length;) {
    const lineEnd = text.indexOf('\n', position);
    const end = lineEnd === -1 ? text.length : lineEnd;
    const plain = withoutReturn(text.slice(position, end));
    const { cells, next, newlines } = plain.includes('"')
      ? quotedRow(text, position, line)
      : { cells: plain.split(','), next: end + 1, newlines: 0 };
    if (cells.length > 1 || cells[0]?.trim() !== '') onRow(cells, line);
    position = next;
    line += 1 + newlines;
  }
  return line;
}

/** One row whose cells may be quoted, with where the next begins and how many line ends its cells hold. */
function quotedRow(
  text: string,
  from: number,
  line: number,
): { cells: string[]; next: number; newlines: number } {
  const cells: string[] = [];
  let newlines = 0;
  for (let position = from; ;) {
    let end: number;
    if (text.charCodeAt(position) === 34) {
      let close = text.indexOf('"', position + 1);
      while (close !== -1 && text.charCodeAt(close + 1) === 34) close = text.indexOf('"', close + 2);
      if (close === -1) throw unreadable('a quote is opened here and never closed', line + newlines);
      const cell = text.slice(position + 1, close).replaceAll('""', '"');
      cells.push(cell);
      newlines += cell.split('\n').length - 1;
      end = close + 1;
      if (text.startsWith('\r\n', end) || (text.charCodeAt(end) === 13 && end + 1 === text.length)) end += 1;
      if (end < text.length && text[end] !== ',' && text[end] !== '\n')
        throw unreadable('quotes that do not match: more follows a closing quote', line + newlines);
    } else {
      const [comma, lineEnd] = [text.indexOf(',', position), text.indexOf('\n', position)];
      end = Math.min(comma === -1 ? text.length : comma, lineEnd === -1 ? text.length : lineEnd);
      const cell = text.slice(position, end);
      if (cell.includes('"'))
        throw unreadable('quotes that do not match: a quote within a bare cell', line + newlines);
      cells.push(end === comma ? cell : withoutReturn(cell));
    }
    if (text[end] !== ',') return { cells, next: end + 1, newlines };
    position = end + 1;
  }
}

/** Without the carriage return of a line that ends with CR LF. */
function withoutReturn(text: string): string {
  return text.endsWith('\r') ? text.slice(0, -1) : text;
}
