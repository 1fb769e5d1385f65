import type { MapHeader } from './map-columns';
import type { RawMap } from './raw-maps';
import { readNumber } from './read-number';

/** What the rows of one wafer share to the letter: all before and all behind their place and value. */
export interface RowFrame {
  prefix: string;
  suffix: string;
}

/** Where place and value stand within their three neighbouring cells; null where they are not neighbours. */
export interface RowCore {
  first: number;
  x: number;
  y: number;
  value: number;
}

export function rowCore({ x, y, value }: MapHeader): RowCore | null {
  const first = Math.min(x, y, value);
  return Math.max(x, y, value) - first === 2
    ? { first, x: x - first, y: y - first, value: value - first }
    : null;
}

/** The frame of rows that begin with these cells; null where the cells do not stand in the text as they are. */
export function rowFrame(core: RowCore, cells: readonly string[]): RowFrame | null {
  if (cells.some((cell) => /[",\n]/.test(cell))) return null;
  const before = cells.slice(0, core.first);
  const behind = cells.slice(core.first + 3);
  return {
    prefix: before.map((cell) => `${cell},`).join(''),
    suffix: behind.map((cell) => `,${cell}`).join(''),
  };
}

/**
 * Reads rows of text without quotes as long as they repeat the wafer's words to the letter and hold three plain
 * numbers: nearly every row of a long file. Returns where the first other row begins, and how many rows it took.
 */
export function repeatedRows(
  text: string,
  from: number,
  line: number,
  frame: RowFrame,
  core: RowCore,
  map: RawMap,
): { position: number; rows: number } {
  let position = from;
  let rows = 0;
  const cells = [NaN, NaN, NaN];
  while (position < text.length && text.startsWith(frame.prefix, position)) {
    const lineEnd = text.indexOf('\n', position);
    const next = lineEnd === -1 ? text.length : lineEnd + 1;
    let end = lineEnd === -1 ? text.length : lineEnd;
    if (text.charCodeAt(end - 1) === 13) end -= 1;
    const coreEnd = end - frame.suffix.length;
    let start = position + frame.prefix.length;
    if (coreEnd < start || (frame.suffix !== '' && !text.startsWith(frame.suffix, coreEnd))) break;
    for (let i = 0; i < 3; i += 1) {
      const comma = i === 2 ? coreEnd : text.indexOf(',', start);
      const isInside = comma !== -1 && comma <= coreEnd;
      const value = isInside ? readNumber(text.slice(start, comma)) : NaN;
      cells[i] = value ?? NaN;
      start = comma + 1;
    }
    const x = cells[core.x] as number;
    const y = cells[core.y] as number;
    const value = cells[core.value] as number;
    if (Number.isNaN(x) || Number.isNaN(y) || Number.isNaN(value)) break;
    map.xMm.push(x);
    map.yMm.push(y);
    map.values.push(value);
    map.lines.push(line + rows);
    rows += 1;
    position = next;
  }
  return { position, rows };
}
